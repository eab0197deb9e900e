package plumbray.cli.report;

import java.util.Optional;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.rectify.Rectified;
import plumbray.imaging.rectify.SigmaPlane;

/**
 * All that a photo's page shows.
 *
 * @param name what the photo is called
 * @param result what the fit found
 * @param photo the photo; empty where points alone were fitted
 * @param redrawn the redrawn photo; empty where there is none
 * @param sigma how surely its pixels stand where they do; empty where there is none
 * @param provenance files and program
 */
public record ReportInput(
    String name,
    FitResult result,
    Optional<Photo> photo,
    Optional<Rectified> redrawn,
    Optional<SigmaPlane> sigma,
    Provenance provenance) {}
