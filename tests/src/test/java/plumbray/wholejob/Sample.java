package plumbray.wholejob;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.sight.Sight;
import plumbray.cli.document.SightReader;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.SightFit;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoReader;

/**
 * A sample photo with its fit and with what it was drawn from.
 *
 * @param name the photo's name without ending
 * @param photo the photo
 * @param result its fit
 * @param truth the sight it was drawn from
 * @param marks the staff's edges
 */
record Sample(String name, Photo photo, FitResult result, Sight truth, List<Mark> marks) {
  private static final Path FOLDER = Path.of("..", "sample-images");

  /**
   * One edge of a staff.
   *
   * @param heightM height above the ground, m
   * @param straightRowPx row along straight rays, px
   * @param images where it is seen
   */
  record Mark(double heightM, double straightRowPx, List<Image> images) {}

  /** One image of an edge: which way up, and where, px. */
  record Image(boolean upright, double u, double v) {}

  static Sample of(String name) {
    try {
      Photo photo = PhotoReader.read(FOLDER.resolve(name + ".jpg"));
      Sight asked = SightReader.read(FOLDER.resolve(name + ".sight.json"));
      return new Sample(
          name,
          photo,
          new SightFit().fit(asked, Optional.of(photo)),
          SightReader.read(FOLDER.resolve(name + ".truth.sight.json")),
          marks(asked, new ObjectMapper().readTree(FOLDER.resolve(name + ".truth.json").toFile())));
    } catch (PhotoException | IOException e) {
      throw new UncheckedIOException(e.getMessage(), new IOException(e));
    }
  }

  private static List<Mark> marks(Sight asked, JsonNode truth) {
    double distanceM = asked.references().get(0).distanceM();
    List<Mark> marks = new ArrayList<>();
    for (JsonNode mark : truth.get("marks")) {
      if (mark.get("distanceM").asDouble() == distanceM) {
        List<Image> images = new ArrayList<>();
        for (JsonNode image : mark.get("images")) {
          JsonNode pixel = image.get("pixel");
          images.add(
              new Image(
                  image.get("sense").asText().equals("upright"),
                  pixel.get(0).asDouble(),
                  pixel.get(1).asDouble()));
        }
        marks.add(
            new Mark(
                mark.get("heightM").asDouble(),
                mark.get("straightPixel").get(1).asDouble(),
                images));
      }
    }
    return marks;
  }

  double distanceM() {
    return result.asked().references().get(0).distanceM();
  }

  /** Metres at the staff that one pixel spans along straight rays. */
  double metresPerPx() {
    return distanceM() * truth.camera().camera().radPerPx();
  }
}
