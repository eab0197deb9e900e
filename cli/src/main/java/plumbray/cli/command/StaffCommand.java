package plumbray.cli.command;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;
import picocli.CommandLine.Spec;
import plumbray.cli.sheet.Paper;
import plumbray.cli.work.StaffChoice;
import plumbray.cli.work.StaffWorker;

/** {@code plumbray staff}: draws a staff in true scale. */
@Command(
    name = "staff",
    description = {
      "Draws a coded staff in true scale, to print and set up in the picture.",
      "Its bars form a binary"
          + " sequence, so that any good stretch of it tells its own height and which way up it is"
          + " seen. An element is made some 8 pixels high at the sight's distance.",
      "",
      "Writes, NAME being the sight file's (without one, staff.pdf and staff.svg):",
      "  NAME.staff.pdf  sheets for an ordinary printer, to cut and join",
      "  NAME.staff.svg  the whole staff, for a plotter or a sign maker",
      "and prints what to paste into a reference of the sight file.",
      "",
      "Printers shrink: measure the 100 mm bars on the sheets, and the finished staff, before use."
          + " Keep clear of traffic and rails when setting up, ask whoever runs the place, and take"
          + " a lookout.",
      ""
    },
    sortOptions = false)
final class StaffCommand implements Callable<Integer> {
  private static final double URAD = 1e-6;
  private static final double MM = 1e-3;

  @Spec private CommandSpec spec;

  @ParentCommand private PlumbrayCommand parent;

  @Parameters(
      index = "0",
      arity = "0..1",
      paramLabel = "SIGHT",
      description = "Sight file: its camera, and the distance of its first reference or region.")
  private Path sightFile;

  @Option(names = "--distance-m", paramLabel = "M", description = "Distance of the staff, m.")
  private Double distanceM;

  @Option(
      names = "--pixel-urad",
      paramLabel = "URAD",
      description = "Angle of a pixel, microradians: pixel pitch over focal length.")
  private Double pixelUrad;

  @Option(
      names = "--height-m",
      paramLabel = "M",
      description = "Height of the coded part, m, at most.")
  private Double heightM;

  @Option(
      names = "--bottom-m",
      paramLabel = "M",
      defaultValue = "0",
      description = "Height of its lowest edge above the foot, m; default 0.")
  private double bottomM;

  @Option(
      names = "--module-mm",
      paramLabel = "MM",
      description = "Height of an element, mm, instead of the one chosen.")
  private Double moduleMm;

  @Option(
      names = "--bits",
      paramLabel = "N",
      description = "Stages of the code's register, 5 to 9, instead of those chosen.")
  private Integer bits;

  @Option(
      names = "--edges-m",
      paramLabel = "M",
      split = ",",
      description = "Draw a plain staff with these edges, m above the foot, rising, and no code.")
  private List<Double> edgesM;

  @Option(
      names = "--first-bar",
      paramLabel = "KIND",
      defaultValue = "dark",
      description = "Which the lowest bar is: dark (default) or bright.")
  private String firstBar;

  @Option(
      names = "--width-mm",
      paramLabel = "MM",
      defaultValue = "140",
      description = "Width of the bars, mm, 20 to 148 (A4) or 153 (Letter); default 140.")
  private double widthMm;

  @Option(
      names = "--paper",
      paramLabel = "SIZE",
      defaultValue = "a4",
      description = "Paper of the sheets: a4 (default) or letter.")
  private String paper;

  @Option(
      names = "--out",
      required = true,
      paramLabel = "DIR",
      description = "Folder for the drawings.")
  private Path folder;

  @Override
  public Integer call() throws IOException {
    StaffWorker.Request request =
        new StaffWorker.Request(
            Optional.ofNullable(sightFile),
            optional("--distance-m", distanceM, 1.0, 1.0, 200_000.0),
            optional("--pixel-urad", pixelUrad, URAD, 0.01, 1e4),
            new StaffWorker.Print(
                choice("--paper", paper, "a4", "letter") ? Paper.A4 : Paper.LETTER, widthMm),
            folder);
    checkWidth(request.print());
    boolean dark = choice("--first-bar", firstBar, "dark", "bright");
    List<String> lines = edgesM == null ? coded(request, dark) : plain(request, dark);
    lines.forEach(this::say);
    return ExitStatus.DONE.code();
  }

  private void say(String line) {
    if (line.startsWith(StaffWorker.WARNING)) {
      parent.terminal().warning(line);
    } else {
      parent.terminal().result(line);
    }
  }

  private List<String> coded(StaffWorker.Request request, boolean dark) throws IOException {
    if (heightM == null) {
      throw wrong("--height-m is missing, must be given (height of the coded part, m)");
    }
    StaffChoice.Wish wish =
        new StaffChoice.Wish(
            within("--height-m", heightM, 0.01, 100.0),
            within("--bottom-m", bottomM, -100.0, 100.0),
            optional("--module-mm", moduleMm, MM, 1.0, 1000.0),
            bits == null ? OptionalInt.empty() : OptionalInt.of((int) within("--bits", bits, 5, 9)),
            dark);
    return StaffWorker.coded(request, wish);
  }

  private List<String> plain(StaffWorker.Request request, boolean dark) throws IOException {
    double[] edges = edgesM.stream().mapToDouble(Double::doubleValue).toArray();
    if (edges.length < 2) {
      throw wrong("--edges-m is one edge, must be two at least (a bar lies between two edges)");
    }
    for (int i = 0; i < edges.length; i++) {
      within("--edges-m", edges[i], i == 0 ? -100.0 : edges[i - 1] + MM, 100.0);
    }
    return StaffWorker.plain(request, edges, dark);
  }

  private void checkWidth(StaffWorker.Print print) {
    within("--width-mm", print.widthMm(), 20.0, print.paper().widestMm());
  }

  private OptionalDouble optional(
      String name, Double value, double unit, double lowest, double highest) {
    return value == null
        ? OptionalDouble.empty()
        : OptionalDouble.of(unit * within(name, value, lowest, highest));
  }

  private double within(String name, double value, double lowest, double highest) {
    if (!(value >= lowest && value <= highest)) {
      String unit = name.substring(name.lastIndexOf('-') + 1).replace("bits", "stages");
      throw wrong(
          "%s is %s %s, must be %s to %s %s".formatted(name, value, unit, lowest, highest, unit));
    }
    return value;
  }

  /** Whether it is the first of the two. */
  private boolean choice(String name, String value, String first, String second) {
    String lower = value.toLowerCase(Locale.ROOT);
    if (!lower.equals(first) && !lower.equals(second)) {
      throw wrong("%s is %s, must be %s or %s".formatted(name, value, first, second));
    }
    return lower.equals(first);
  }

  private ParameterException wrong(String message) {
    return new ParameterException(spec.commandLine(), message);
  }
}
