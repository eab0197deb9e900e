package plumbray.cli.work;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import plumbray.calibration.sight.CodedTarget;
import plumbray.calibration.sight.Region;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StaffTarget;
import plumbray.cli.document.BatchPhoto;
import plumbray.cli.document.InputException;
import plumbray.cli.document.Numbers;
import plumbray.cli.document.SightReader;
import plumbray.cli.document.StaffText;
import plumbray.cli.document.WholeFile;
import plumbray.cli.sheet.Paper;
import plumbray.cli.sheet.StaffDrawing;
import plumbray.cli.sheet.StaffPdf;
import plumbray.cli.sheet.StaffSvg;

/** Draws staffs, and says how they were chosen. */
public final class StaffWorker {
  /** How lines begin that must be seen. */
  public static final String WARNING = "warning: ";

  private static final double MM_PER_M = 1e3;

  /** Elements beyond two windows' worth that a stretch needs in practice. */
  private static final int SPARE_ELEMENTS = 6;

  private static final double FEW_PX = 6.0;
  private static final double MANY_PX = 10.0;
  private static final double NARROW_PX = 8.0;

  private StaffWorker() {}

  /**
   * On what it is printed.
   *
   * @param paper the paper
   * @param widthMm width of the bars, mm
   */
  public record Print(Paper paper, double widthMm) {}

  /**
   * For what sight a staff is drawn, and where to.
   *
   * @param sightFile the sight file, where there is one
   * @param distanceM distance of the staff, m, where it is not the sight's
   * @param pixelRad angle of a pixel, rad, where it is not the sight's
   * @param print on what it is printed
   * @param folder where the files go
   */
  public record Request(
      Optional<Path> sightFile,
      OptionalDouble distanceM,
      OptionalDouble pixelRad,
      Print print,
      Path folder) {}

  /**
   * Draws a coded staff.
   *
   * @param request for what
   * @param wish what is asked for
   * @return what to say of it
   * @throws IOException when a file cannot be written
   */
  public static List<String> coded(Request request, StaffChoice.Wish wish) throws IOException {
    Optional<Sight> sight = request.sightFile().map(SightReader::read);
    OptionalDouble distanceM = distanceM(request, sight);
    OptionalDouble pixelM = pixelM(request, sight, distanceM);
    CodedTarget code = StaffChoice.of(wish, pixelM);
    String description =
        "coded staff: %d elements of %s mm, %d-stage register, lowest edge %s m above the foot"
            .formatted(code.elements(), mm(code.moduleM()), code.bits(), metres(code.bottomM()));
    List<String> lines = new ArrayList<>();
    lines.add(description);
    pixelM.ifPresent(
        pixel -> lines.addAll(onTheSight(code, distanceM.orElseThrow(), pixel, request.print())));
    lines.add(
        "any %d elements in a row that show 6 edges tell their height and which way up they are"
            .formatted(CodedTarget.fewestElements(code.bits()) + SPARE_ELEMENTS));
    lines.addAll(draw(request, code.staff(), description));
    lines.add(StaffText.of(code));
    return lines;
  }

  /**
   * Draws a staff of given bars.
   *
   * @param request for what
   * @param edgesM heights of the edges above the foot, m, rising
   * @param firstDark whether the lowest bar is dark
   * @return what to say of it
   * @throws IOException when a file cannot be written
   */
  public static List<String> plain(Request request, double[] edgesM, boolean firstDark)
      throws IOException {
    StaffTarget staff = new StaffTarget(edgesM, firstDark);
    String description =
        "staff of %d bars from %s to %s m above the foot"
            .formatted(edgesM.length - 1, metres(edgesM[0]), metres(edgesM[edgesM.length - 1]));
    List<String> lines = new ArrayList<>(draw(request, staff, description));
    lines.add(StaffText.of(staff));
    return lines;
  }

  private static List<String> draw(Request request, StaffTarget staff, String description)
      throws IOException {
    String name = request.sightFile().map(BatchPhoto::resultName).orElse("");
    String title = name.isEmpty() ? "Staff" : "Staff for " + name;
    String file = name.isEmpty() ? "staff" : name + ".staff";
    Print print = request.print();
    StaffDrawing drawing = new StaffDrawing(title, description, staff, print.widthMm());
    Path pdf = request.folder().resolve(file + ".pdf");
    Path svg = request.folder().resolve(file + ".svg");
    int[] sheets = new int[1];
    WholeFile.write(pdf, out -> sheets[0] = StaffPdf.write(drawing, print.paper(), out));
    WholeFile.write(svg, StaffSvg.text(drawing));
    return List.of(
        "%s: %d %s of %s paper; print at 100 %% and measure the check bars"
            .formatted(
                pdf,
                sheets[0],
                sheets[0] == 1 ? "sheet" : "sheets",
                print.paper() == Paper.A4 ? "A4" : "Letter"),
        svg + ": the whole staff, 1 unit a millimetre");
  }

  private static List<String> onTheSight(
      CodedTarget code, double distanceM, double pixelM, Print print) {
    double elementPx = code.moduleM() / pixelM;
    double widthPx = print.widthMm() / MM_PER_M / pixelM;
    List<String> lines = new ArrayList<>();
    lines.add(
        "a pixel shows %s mm at %s m: an element is %s px high (6 to 10 is best), the staff %s px wide"
            .formatted(
                mm(pixelM),
                Numbers.significant(distanceM, 5),
                Numbers.significant(elementPx, 2),
                Numbers.significant(widthPx, 2)));
    if (elementPx < FEW_PX || elementPx > MANY_PX) {
      lines.add(WARNING + "elements are not 6 to 10 px high; choose another --module-mm");
    }
    if (widthPx < NARROW_PX) {
      lines.add(
          WARNING
              + "the staff is narrower than 8 px; mount %d copies side by side"
                  .formatted((int) Math.ceil(NARROW_PX / widthPx)));
    }
    return lines;
  }

  private static OptionalDouble distanceM(Request request, Optional<Sight> sight) {
    if (request.distanceM().isPresent() || sight.isEmpty()) {
      return request.distanceM();
    }
    if (!sight.get().references().isEmpty()) {
      return OptionalDouble.of(sight.get().references().get(0).distanceM());
    }
    return sight.get().regions().stream()
        .filter(region -> !region.ground())
        .mapToDouble(Region::distanceM)
        .findFirst();
  }

  private static OptionalDouble pixelM(
      Request request, Optional<Sight> sight, OptionalDouble distanceM) {
    OptionalDouble pixelRad =
        request.pixelRad().isPresent() || sight.isEmpty()
            ? request.pixelRad()
            : OptionalDouble.of(sight.get().camera().camera().radPerPx());
    if (pixelRad.isPresent() && distanceM.isEmpty()) {
      throw new InputException(
          "the staff's distance is not known, must be (an element of the code is some pixels high);"
              + " give --distance-m");
    }
    return pixelRad.isPresent()
        ? OptionalDouble.of(pixelRad.getAsDouble() * distanceM.getAsDouble())
        : OptionalDouble.empty();
  }

  private static String mm(double lengthM) {
    return Numbers.significant(lengthM * MM_PER_M, 4);
  }

  private static String metres(double heightM) {
    return Numbers.significant(heightM, 5);
  }
}
