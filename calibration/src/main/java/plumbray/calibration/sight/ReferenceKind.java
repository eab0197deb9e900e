package plumbray.calibration.sight;

import java.util.Optional;

/** What is known about a reference: the edges of a staff's bars, its code, or single points. */
public sealed interface ReferenceKind permits StaffTarget, CodedTarget, PointTarget {
  /** The dark and bright bars that a photo shows; none where single points are all there is. */
  Optional<StaffTarget> bars();
}
