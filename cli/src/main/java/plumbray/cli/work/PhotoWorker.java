package plumbray.cli.work;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import plumbray.cli.document.Digest;
import plumbray.cli.document.FitDocument;
import plumbray.cli.document.FitWriter;
import plumbray.cli.document.InputException;
import plumbray.cli.document.MappingCsv;
import plumbray.cli.document.ProgramVersion;
import plumbray.cli.document.RedrawnOrigin;
import plumbray.cli.document.WholeFile;
import plumbray.cli.report.PhotoReport;
import plumbray.cli.report.Provenance;
import plumbray.cli.report.ReportInput;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.Warning;
import plumbray.imaging.measure.MappingRow;
import plumbray.imaging.metadata.PhotoOrigin;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoReader;
import plumbray.imaging.photo.WriteOptions;
import plumbray.imaging.rectify.Rectified;
import plumbray.imaging.rectify.RedrawOptions;
import plumbray.imaging.rectify.SigmaPlane;

/**
 * Fits one photo and writes all of its results. The fit file comes last and lists the digests of
 * the others, so that where it is there and agrees with them, all of them are there and whole.
 */
public final class PhotoWorker {
  private final Fitting fitting;
  private final Optional<RedrawOptions> redraw;
  private final WriteOptions storing;
  private final int threads;

  /**
   * Creates a worker, which may be used by several threads.
   *
   * @param fitting what fits
   * @param redraw how to redraw the photo too; empty to leave it alone
   * @param threads how many threads one photo may use
   */
  public PhotoWorker(Fitting fitting, Optional<RedrawOptions> redraw, int threads) {
    this(fitting, redraw, WriteOptions.likeSource(), threads);
  }

  private PhotoWorker(
      Fitting fitting, Optional<RedrawOptions> redraw, WriteOptions storing, int threads) {
    this.fitting = fitting;
    this.redraw = redraw;
    this.storing = storing.withThreads(threads);
    this.threads = threads;
  }

  /**
   * The same, storing redrawn photos otherwise.
   *
   * @param wanted how to store them
   */
  public PhotoWorker storing(WriteOptions wanted) {
    return new PhotoWorker(fitting, redraw, wanted, threads);
  }

  /**
   * The fit of a photo whose results are all there and would come out the same again.
   *
   * @param task the photo and its sight
   * @param files where its results would be
   * @return the fit; empty where the work must be done
   * @throws IOException when a file cannot be read
   */
  public Optional<FitDocument> finished(PhotoTask task, ResultFiles files) throws IOException {
    return FinishedWork.find(task, files, way());
  }

  private Optional<String> way() {
    return redraw.map(options -> options.label() + storing.label());
  }

  /**
   * Fits a photo and writes its results.
   *
   * @param task the photo and its sight
   * @param files where the results go
   * @return what was found; it says itself when the photo failed
   * @throws IOException when a file cannot be read or written for no fault of the photo
   */
  public FitDocument work(PhotoTask task, ResultFiles files) throws IOException {
    Files.deleteIfExists(files.fit());
    List<Digest> inputs = task.inputs();
    try {
      return work(task, photo(task), inputs, files);
    } catch (PhotoException e) {
      FitResult failed = FitResult.failed(task.sight(), reason(task, e));
      return writeFailed(new Fitted(task, Optional.empty(), failed, inputs), files);
    }
  }

  /** What is wrong with the photo. Its results name it already, so its path is left out. */
  private static String reason(PhotoTask task, PhotoException e) {
    String path = task.photo().map(photo -> photo + ": ").orElse("");
    return e.getMessage().startsWith(path)
        ? e.getMessage().substring(path.length())
        : e.getMessage();
  }

  /**
   * Fits a photo that was named by itself, where there are no others to go on with: nothing is
   * written when it cannot be used at all.
   *
   * @param task the photo and its sight
   * @param files where the results go
   * @return what was found; it says itself when the fit failed
   * @throws InputException when the photo cannot be read or is of another size than its sight says
   * @throws IOException when a file cannot be read or written for no fault of the photo
   */
  public FitDocument workAlone(PhotoTask task, ResultFiles files) throws IOException {
    Optional<Photo> photo;
    try {
      photo = photo(task);
    } catch (PhotoException e) {
      throw new InputException(e.getMessage(), e);
    }
    Optional<String> complaint = complaint(task, photo);
    if (complaint.isPresent()) {
      throw new InputException(complaint.get());
    }
    WholeFile.makeFolder(files.folder());
    Files.deleteIfExists(files.fit());
    return work(task, photo, task.inputs(), files);
  }

  private static Optional<String> complaint(PhotoTask task, Optional<Photo> photo) {
    return photo.flatMap(p -> PhotoSize.complaint(task.photo().get(), p, task.sight().camera()));
  }

  private FitDocument work(
      PhotoTask task, Optional<Photo> photo, List<Digest> inputs, ResultFiles files)
      throws IOException {
    FitResult result =
        complaint(task, photo)
            .map(error -> FitResult.failed(task.sight(), error))
            .orElseGet(() -> heeded(fitting.fit(task.sight(), photo), photo));
    Fitted fitted = new Fitted(task, photo, result, inputs);
    return result.status() == FitStatus.FAILED ? writeFailed(fitted, files) : write(fitted, files);
  }

  /** A fit to light that may not be what the photo means is doubtful. */
  private FitResult heeded(FitResult result, Optional<Photo> photo) {
    FitResult heeded =
        photo
            .flatMap(Photo::profileComplaint)
            .map(complaint -> result.doubted(new Warning("colour-profile", complaint + ".")))
            .orElse(result);
    List<String> complaints =
        photo.filter(p -> redraw.isPresent()).map(p -> p.metadata().complaints()).orElse(List.of());
    for (String complaint : complaints) {
      heeded = heeded.noted(new Warning("metadata", "Of the photo, " + complaint + "."));
    }
    return heeded;
  }

  private static Optional<Photo> photo(PhotoTask task) throws PhotoException {
    if (task.photo().isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(PhotoReader.read(task.photo().get()));
  }

  private FitDocument writeFailed(Fitted fitted, ResultFiles files) throws IOException {
    for (Path stale : files.rectifiedOfAnyEnding()) {
      Files.deleteIfExists(stale);
    }
    Files.deleteIfExists(files.mask());
    Files.deleteIfExists(files.sigma());
    Files.deleteIfExists(files.mapping());
    writePage(fitted, Optional.empty(), Optional.empty(), files);
    FitDocument fit =
        FitDocument.failed(fitted.result(), fitted.inputs())
            .withOutputs(digests(List.of(files.page())), Optional.empty());
    WholeFile.write(files.fit(), FitWriter.text(fit));
    return fit;
  }

  private FitDocument write(Fitted fitted, ResultFiles files) throws IOException {
    FitResult result = fitted.result();
    SightOptics optics = SightOptics.of(result.sight(), result.estimates().names());
    List<MappingRow> rows = MappingRow.of(optics, result.estimates());
    WholeFile.write(files.mapping(), MappingCsv.text(rows));
    List<Path> outputs = new ArrayList<>(List.of(files.mapping(), files.page()));
    Optional<Redrawing> redrawing =
        fitted.photo().flatMap(p -> redraw).map(way -> new Redrawing(optics, way, threads));
    Optional<Rectified> redrawn = redrawing.map(r -> r.redraw(fitted.photo().get()));
    Optional<SigmaPlane> sigma =
        redrawing
            .filter(r -> !result.estimates().names().isEmpty())
            .map(r -> Uncertainty.plane(r.map(), rows));
    FitDocument fit = FitDocument.of(result, optics, fitted.inputs());
    if (redrawn.isPresent()) {
      outputs.addAll(writeRedrawn(redrawn.get(), fit, fitted.task().photo().get(), files));
    }
    Files.deleteIfExists(files.sigma());
    if (sigma.isPresent()) {
      Uncertainty.write(sigma.get(), files.sigma());
      outputs.add(files.sigma());
    }
    writePage(fitted, redrawn, sigma, files);
    fit = fit.withOutputs(digests(outputs), redrawn.isPresent() ? way() : Optional.empty());
    WholeFile.write(files.fit(), FitWriter.text(fit));
    return fit;
  }

  private List<Path> writeRedrawn(
      Rectified redrawn, FitDocument fit, Path photoFile, ResultFiles files) throws IOException {
    PhotoOrigin origin = RedrawnOrigin.of(fit, Digest.of(photoFile), way().orElseThrow());
    return Redrawing.write(Redrawing.from(origin, redrawn), photoFile, files, storing);
  }

  private static void writePage(
      Fitted fitted, Optional<Rectified> redrawn, Optional<SigmaPlane> sigma, ResultFiles files)
      throws IOException {
    Provenance provenance = new Provenance(fitted.inputs(), ProgramVersion.name());
    ReportInput input =
        new ReportInput(
            fitted.task().label(), fitted.result(), fitted.photo(), redrawn, sigma, provenance);
    WholeFile.write(files.page(), new PhotoReport(input).html());
  }

  private record Fitted(
      PhotoTask task, Optional<Photo> photo, FitResult result, List<Digest> inputs) {}

  private static List<Digest> digests(List<Path> files) throws IOException {
    List<Digest> digests = new ArrayList<>();
    for (Path file : files) {
      digests.add(Digest.of(file));
    }
    return digests;
  }
}
