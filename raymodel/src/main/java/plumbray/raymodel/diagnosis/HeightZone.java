package plumbray.raymodel.diagnosis;

/**
 * A zone of heights above the local ground.
 *
 * @param lowM where it begins, m
 * @param highM where it ends, m; infinite where it reaches beyond all heights looked at
 */
public record HeightZone(double lowM, double highM) {}
