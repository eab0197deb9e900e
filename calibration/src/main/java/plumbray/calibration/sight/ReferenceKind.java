package plumbray.calibration.sight;

/** What is known about a reference: the edges of a staff's bars, or single points. */
public sealed interface ReferenceKind permits StaffTarget, PointTarget {}
