package plumbray.imaging.reading;

/**
 * Where a staff stands.
 *
 * @param reference its index among the sight's references
 * @param distanceM its distance, m
 */
record StaffPlace(int reference, double distanceM) {}
