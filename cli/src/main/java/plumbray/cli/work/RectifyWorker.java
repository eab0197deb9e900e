package plumbray.cli.work;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import plumbray.cli.document.BatchPhoto;
import plumbray.cli.document.Digest;
import plumbray.cli.document.HeldSight;
import plumbray.cli.document.InputException;
import plumbray.cli.document.MappingCsv;
import plumbray.cli.document.RedrawnOrigin;
import plumbray.cli.document.WholeFile;
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

/** Redraws a photo with a sight of which all is known. */
public final class RectifyWorker {
  private final RedrawOptions options;
  private final WriteOptions storing;
  private final int threads;

  /**
   * What came of it.
   *
   * @param picture the redrawn photo's file
   * @param caution why it may not be as exact as it should, where that is so
   * @param complaints what of the photo's metadata could not be carried into it, a line each
   */
  public record Redrawn(Path picture, Optional<Warning> caution, List<String> complaints) {
    /** Copies the list. */
    public Redrawn {
      complaints = List.copyOf(complaints);
    }
  }

  /**
   * Creates a worker.
   *
   * @param options how to redraw photos
   * @param storing how to store them
   * @param threads how many threads to use
   */
  public RectifyWorker(RedrawOptions options, WriteOptions storing, int threads) {
    this.options = options;
    this.storing = storing.withThreads(threads);
    this.threads = threads;
  }

  /**
   * Writes the redrawn photo, its mask, the mapping and, after a fit, its uncertainty.
   *
   * @param heldFile a fit, or a sight file whose quantities are all held
   * @param photoFile the photo
   * @param folder where the results go
   * @return what came of it
   * @throws IOException when a file cannot be written
   */
  public Redrawn rectify(Path heldFile, Path photoFile, Path folder) throws IOException {
    HeldSight held = HeldSight.read(heldFile);
    SightOptics optics = Tracing.optics(heldFile, held.sight(), held.estimates().names());
    ResultFiles files = new ResultFiles(folder, BatchPhoto.resultName(photoFile));
    Photo photo = photo(held, photoFile);
    WholeFile.makeFolder(folder);
    Redrawing redrawing = new Redrawing(optics, options, threads);
    Rectified rectified = redrawing.redraw(photo);
    PhotoOrigin origin =
        RedrawnOrigin.of(held, Digest.of(heldFile), Digest.of(photoFile), options.label());
    List<Path> written =
        Redrawing.write(Redrawing.from(origin, rectified), photoFile, files, storing);
    List<MappingRow> rows = MappingRow.of(optics, held.estimates());
    WholeFile.write(files.mapping(), MappingCsv.text(rows));
    if (held.estimates().names().isEmpty()) {
      Files.deleteIfExists(files.sigma());
    } else {
      Uncertainty.write(Uncertainty.plane(redrawing.map(), rows), files.sigma());
    }
    return new Redrawn(written.get(0), optics.caution(), photo.metadata().complaints());
  }

  private static Photo photo(HeldSight held, Path photoFile) {
    try {
      Photo photo = PhotoReader.read(photoFile);
      Optional<String> complaint = PhotoSize.complaint(photoFile, photo, held.sight().camera());
      if (complaint.isPresent()) {
        throw new InputException(complaint.get());
      }
      return photo;
    } catch (PhotoException e) {
      throw new InputException(e.getMessage(), e);
    }
  }
}
