package plumbray.imaging.scene;

import java.util.List;
import java.util.OptionalDouble;
import plumbray.calibration.camera.PixelPoint;
import plumbray.raymodel.mapping.Sense;

/**
 * What is known exactly about a simulated photo.
 *
 * @param profile temperature against height
 * @param lines what the sight line does, for each distance at which something stands
 * @param marks the edges of all staffs, with all images of each
 */
public record SceneTruth(List<AirRow> profile, List<Line> lines, List<Mark> marks) {
  /** Copies the lists. */
  public SceneTruth {
    profile = List.copyOf(profile);
    lines = List.copyOf(lines);
    marks = List.copyOf(marks);
  }

  /**
   * The air at one height.
   *
   * @param heightM height above the ground (m)
   * @param temperatureK temperature (K)
   * @param gradientKPerM its change with height (K/m)
   */
  public record AirRow(double heightM, double temperatureK, double gradientKPerM) {}

  /**
   * The sight line at one distance.
   *
   * @param distanceM the distance (m)
   * @param vanishingLineRowPx row of the vanishing line at the principal column (px)
   * @param lowestVisibleHeightM the lowest height above the ground there that is seen (m)
   * @param imagesMost how many images one height can have
   */
  public record Line(
      double distanceM,
      OptionalDouble vanishingLineRowPx,
      OptionalDouble lowestVisibleHeightM,
      int imagesMost) {}

  /**
   * One edge of a staff.
   *
   * @param thing name of the staff
   * @param distanceM its distance (m)
   * @param heightM height of the edge above the staff's foot (m)
   * @param straight where it would be seen along straight rays
   * @param images where it is seen, from the lowest apparent elevation to the highest; images
   *     outside the picture are left out
   */
  public record Mark(
      String thing, double distanceM, double heightM, PixelPoint straight, List<Image> images) {
    /** Copies the list. */
    public Mark {
      images = List.copyOf(images);
    }
  }

  /**
   * One image of an edge.
   *
   * @param sense whether it is seen upright or upside down
   * @param pixel where, at the staff's middle
   */
  public record Image(Sense sense, PixelPoint pixel) {}
}
