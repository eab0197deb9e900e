package plumbray.cli.work;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.IntStream;
import plumbray.calibration.sight.Sight;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.metadata.PhotoOrigin;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoFormat;
import plumbray.imaging.photo.PhotoWriter;
import plumbray.imaging.photo.WriteOptions;
import plumbray.imaging.rectify.ColourRectifier;
import plumbray.imaging.rectify.Rectified;
import plumbray.imaging.rectify.Rectifier;
import plumbray.imaging.rectify.RectifyMap;
import plumbray.imaging.rectify.RedrawOptions;

/** Redraws a photo and writes it with its mask. */
final class Redrawing {
  private static final int COLOURS = 3;

  private final SightOptics optics;
  private final RedrawOptions options;
  private final int threads;

  Redrawing(SightOptics optics, RedrawOptions options, int threads) {
    this.optics = optics;
    this.options = options;
    this.threads = threads;
  }

  /** The photo as the sight's straight rays would show it, each colour by its own wavelength. */
  Rectified redraw(Photo photo) {
    Sight sight = optics.sight();
    boolean colours =
        photo.shape().lightChannels() == COLOURS
            && sight.air().channelWavelengthsM().size() == COLOURS;
    return colours ? byColours(photo) : Rectifier.rectify(photo, map(optics), options, threads);
  }

  /**
   * Writes a redrawn photo and its mask.
   *
   * @param rectified the redrawn photo
   * @param photoFile the photo's file, whose ending the redrawn one keeps where it can
   * @param files where the results go
   * @param storing how they are stored
   * @return the files written
   * @throws IOException when one cannot be written
   */
  static List<Path> write(
      Rectified rectified, Path photoFile, ResultFiles files, WriteOptions storing)
      throws IOException {
    String name = photoFile.getFileName().toString();
    Path picture = files.rectified(PhotoFormat.extensionFor(name, rectified.picture().shape()));
    Files.createDirectories(files.folder());
    try {
      PhotoWriter.write(rectified.picture(), picture, storing);
      PhotoWriter.write(rectified.mask().photo(), files.mask(), storing);
    } catch (PhotoException e) {
      throw new IOException(e.getMessage(), e);
    }
    return List.of(picture, files.mask());
  }

  /** The same with its origin, which is written into the redrawn photo's file. */
  static Rectified from(PhotoOrigin origin, Rectified rectified) {
    Photo picture = rectified.picture();
    return new Rectified(
        picture.withMetadata(picture.metadata().withOrigin(origin)), rectified.mask());
  }

  /** Each colour through the air as it is for its own wavelength. */
  private Rectified byColours(Photo photo) {
    List<RectifyMap> maps = IntStream.range(0, COLOURS).mapToObj(this::map).toList();
    return ColourRectifier.rectify(photo, maps, options, threads);
  }

  /** Where everything is seen in the light of the luminance. */
  RectifyMap map() {
    return map(optics);
  }

  private RectifyMap map(int channel) {
    return map(SightOptics.ofChannel(optics.sight(), channel));
  }

  private static RectifyMap map(SightOptics optics) {
    Sight sight = optics.sight();
    return RectifyMap.of(
        optics.camera(), optics.straight(), sight.path().path(), optics.fan(), sight.regions());
  }
}
