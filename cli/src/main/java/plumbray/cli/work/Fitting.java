package plumbray.cli.work;

import java.util.Optional;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.photo.Photo;

/** What estimates what a sight leaves open. */
@FunctionalInterface
public interface Fitting {
  /**
   * Fits.
   *
   * @param sight the sight
   * @param photo the photo; none where all references are points
   * @return the fit, which says itself when it failed
   */
  FitResult fit(Sight sight, Optional<Photo> photo);
}
