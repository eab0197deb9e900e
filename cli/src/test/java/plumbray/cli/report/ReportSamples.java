package plumbray.cli.report;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import plumbray.calibration.camera.PixelPoint;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.PathSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Region;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.calibration.sight.StaffTarget;
import plumbray.cli.document.Digest;
import plumbray.imaging.fit.Alternative;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.ReferenceReading;
import plumbray.imaging.fit.Residuals;
import plumbray.imaging.fit.RowResidual;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.Warning;
import plumbray.imaging.photo.GreyPlane;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PixelBox;
import plumbray.imaging.rectify.MaskPlane;
import plumbray.imaging.rectify.Rectified;
import plumbray.imaging.rectify.SigmaPlane;
import plumbray.imaging.scene.Backdrop;
import plumbray.imaging.scene.LinearColour;
import plumbray.imaging.scene.Paint;
import plumbray.imaging.scene.Scene;
import plumbray.imaging.scene.Sensor;
import plumbray.imaging.scene.Shimmer;
import plumbray.imaging.scene.Simulation;
import plumbray.imaging.scene.SkylineShape;
import plumbray.imaging.scene.StaffShape;
import plumbray.imaging.scene.Thing;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.path.GroundProfile;
import plumbray.raymodel.profile.ProfileFamily;
import plumbray.raymodel.profile.Stability;

/** A made-up fit over hot ground, with a drawn photo; nothing of it was measured. */
final class ReportSamples {

  static final int WIDTH_PX = 720;
  static final int HEIGHT_PX = 560;
  static final double DISTANCE_M = 640.0;
  static final String STAFF = "staff <A> & \"post\"";

  private static final double SIGMA_PX = 0.15;
  private static final double TOP_M = 3.0;

  private ReportSamples() {}

  /** The sight as asked: pitch and profile are open. */
  static Sight asked(double excessK) {
    return sight(
        excessK,
        Quantity.prior(-0.5e-3, 2e-3),
        Quantity.free(excessK),
        Quantity.prior(-0.0098, 0.05));
  }

  private static Sight sight(double excessK, Quantity pitch, Quantity excess, Quantity gradient) {
    Reference staff =
        new Reference(
            STAFF,
            DISTANCE_M,
            Quantity.held(0.0),
            new StaffTarget(edges(), true),
            Optional.of(new ImageBox(335, 150, 385, 390)));
    Quantity height = excess.estimated() ? Quantity.free(0.10) : Quantity.held(0.10);
    return new Sight(
        "brickfield, " + excessK + " K",
        new CameraSetup(
            WIDTH_PX,
            HEIGHT_PX,
            Quantity.held(0.6),
            12e-6,
            new PixelPoint((WIDTH_PX - 1) / 2.0, (HEIGHT_PX - 1) / 2.0),
            0.0,
            0.0,
            Quantity.held(1.62),
            pitch,
            Quantity.held(0.0)),
        new PathSetup(6371000.0, GroundProfile.level(), Quantity.held(0.0)),
        new AirSetup(
            Quantity.held(304.15),
            1.62,
            Quantity.held(100800.0),
            Quantity.held(0.35),
            430.0,
            550e-9,
            List.of()),
        new ProfileSetup(
            Optional.of(ProfileFamily.EXPONENTIAL),
            Map.of("surfaceExcessK", excess, "scaleHeightM", height, "gradientKPerM", gradient),
            Stability.DYER),
        List.of(staff),
        List.of(new Region("all", false, DISTANCE_M, Optional.empty())),
        0.0);
  }

  private static double[] edges() {
    double[] edges = new double[31];
    for (int i = 0; i < edges.length; i++) {
      edges[i] = i * TOP_M / (edges.length - 1);
    }
    return edges;
  }

  /** A fit of that sight. */
  static FitResult result(double excessK, FitStatus status, Optional<Photo> photo) {
    Sight asked = asked(excessK);
    SightParameters parameters = SightParameters.of(asked);
    Sight held = parameters.heldAt(parameters.values());
    List<Warning> warnings =
        status == FitStatus.GOOD
            ? List.of()
            : List.of(
                new Warning(
                    "weak-direction", "Pitch & gradient <together> are hardly determined."));
    return new FitResult(
        status,
        Optional.empty(),
        warnings,
        asked,
        held,
        estimates(parameters),
        new Residuals(31, 0.143, 29.4, 27),
        List.of(
            new Alternative(ProfileFamily.LOGARITHMIC, 61.2, 0.31, FitStatus.DOUBTFUL),
            new Alternative(ProfileFamily.EXPONENTIAL, 40.1, 0.143, FitStatus.GOOD)),
        List.of(reading(held, photo)),
        0.12);
  }

  /** Standard deviations of a usual size; the first and the last quantity hang together. */
  private static Estimates estimates(SightParameters parameters) {
    double[] sigmas = parameters.names().stream().mapToDouble(ReportSamples::sigma).toArray();
    int n = sigmas.length;
    double[][] covariance = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        boolean ends = i + j == n - 1 && Math.abs(i - j) == n - 1;
        covariance[i][j] = sigmas[i] * sigmas[j] * (i == j ? 1.0 : ends ? -0.996 : 0.2);
      }
    }
    return Estimates.of(parameters.names(), parameters.values(), covariance);
  }

  private static double sigma(String name) {
    return switch (name) {
      case "camera.pitchRad" -> 12e-6;
      case "profile.surfaceExcessK" -> 0.42;
      case "profile.scaleHeightM" -> 0.0031;
      default -> 0.021;
    };
  }

  private static ReferenceReading reading(Sight held, Optional<Photo> photo) {
    SightOptics optics = SightOptics.of(held);
    Random random = new Random(5);
    List<RowResidual> rows = new ArrayList<>();
    for (double edge : edges()) {
      for (Branch branch : optics.mapping(DISTANCE_M).branches()) {
        if (branch.holdsElevation(edge)) {
          double row = optics.camera().rowAt(branch.apparentRad(edge));
          double found = row + SIGMA_PX * random.nextGaussian();
          rows.add(new RowResidual(edge, branch.sense(), found, row, SIGMA_PX));
        }
      }
    }
    return new ReferenceReading(STAFF, rows, photo.map(ReportSamples::strip));
  }

  private static ReferenceReading.Strip strip(Photo photo) {
    GreyPlane plane = photo.linearLuminance(new PixelBox(340, 150, 40, 240));
    double[] observed = new double[plane.height()];
    double[] predicted = new double[plane.height()];
    for (int y = 0; y < observed.length; y++) {
      for (int x = 0; x < plane.width(); x++) {
        predicted[y] += plane.at(x, y) / plane.width();
      }
      observed[y] = y == 100 ? Double.NaN : plane.at(3, y);
    }
    return new ReferenceReading.Strip(150.0, observed, predicted);
  }

  /** The scene drawn through the held sight. */
  static Simulation simulation(Sight held) {
    LinearColour sky = new LinearColour(0.55, 0.68, 0.86);
    LinearColour ground = new LinearColour(0.30, 0.24, 0.17);
    Backdrop backdrop =
        new Backdrop(
            new Backdrop.Sky(new LinearColour(0.78, 0.80, 0.80), sky, 0.01),
            new Backdrop.Ground(Paint.flat(ground), List.of(), 20000.0),
            Backdrop.Haze.none());
    Thing staff =
        new Thing(
            "staff",
            DISTANCE_M,
            0.0,
            new StaffShape(0.0, 0.7, edges(), new StaffShape.Bars(0.06, 0.8, true)));
    Thing kiln =
        new Thing(
            "kiln",
            DISTANCE_M + 1.0,
            0.0,
            new SkylineShape(
                new double[][] {
                  {-3.5, 0}, {-3.4, 2.6}, {-2.2, 2.6}, {-2.0, 1.2}, {3.0, 1.0}, {3.4, 0}
                },
                Paint.flat(new LinearColour(0.40, 0.13, 0.08))));
    return new Simulation(
        held,
        new Scene(
            7L,
            backdrop,
            List.of(kiln, staff),
            Shimmer.none(),
            new Sensor(0.6, 1.0, 20000.0, 4.0, 8)));
  }

  /** The photo's page with pictures. */
  static ReportInput input(double excessK, FitStatus status) {
    Sight held = result(excessK, status, Optional.empty()).sight();
    Simulation simulation = simulation(held);
    Photo photo = simulation.photo();
    return new ReportInput(
        "brickfield-1330.jpg",
        result(excessK, status, Optional.of(photo)),
        Optional.of(photo),
        Optional.of(new Rectified(simulation.straightPhoto(), mask())),
        Optional.of(sigma()),
        provenance());
  }

  /** Rising from row to row, not known at the foot. */
  private static SigmaPlane sigma() {
    MaskPlane mask = mask();
    float[] values = new float[mask.widthPx() * mask.heightPx()];
    for (int i = 0; i < values.length; i++) {
      int row = i / mask.widthPx();
      values[i] = row > 0.9 * mask.heightPx() ? Float.NaN : 0.3f * row / mask.heightPx();
    }
    return new SigmaPlane(mask.widthPx(), mask.heightPx(), values);
  }

  static Provenance provenance() {
    String digest = "9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08";
    return new Provenance(
        List.of(
            new Digest("brickfield-1330.jpg", digest), new Digest("brickfield.sight.json", digest)),
        "0.1.0");
  }

  /** Level strips of every code. */
  static MaskPlane mask() {
    byte[] codes = new byte[WIDTH_PX * HEIGHT_PX];
    for (int y = 0; y < HEIGHT_PX; y++) {
      Arrays.fill(codes, y * WIDTH_PX, (y + 1) * WIDTH_PX, (byte) code(y));
    }
    return new MaskPlane(WIDTH_PX, HEIGHT_PX, codes);
  }

  private static int code(int y) {
    if (y < 8) {
      return MaskPlane.OUTSIDE;
    }
    if (y >= 345 && y < 358) {
      return MaskPlane.NEVER_VISIBLE;
    }
    return y >= 358 && y < 365 ? MaskPlane.INVERTED : MaskPlane.UPRIGHT;
  }
}
