package plumbray.benchmark;

import java.util.Optional;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.FanRequest;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.mapping.SightMapping;
import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.RayTracer;

/**
 * The mapping of a picture 26.8 mrad high (4000 rows of a 600 mm lens and 4 micrometres), good to a
 * hundredth of a row.
 */
record PictureMapping(Medium air, int rows, double[] distancesM) {

  private static final double HALF_RAD = 0.0134;
  private static final double TOLERANCE_PX = 0.01;

  RayFan trace() {
    return RayFan.trace(air, SightPath.level(), request());
  }

  FanRequest request() {
    return new FanRequest(
        HotGround.CAMERA_M,
        -HALF_RAD,
        HALF_RAD,
        distancesM,
        TOLERANCE_PX * 2.0 * HALF_RAD / rows,
        air.parameterCount() > 0);
  }

  /** Sum of the heights seen in all rows at the last distance. */
  double rows(RayFan fan) {
    SightMapping mapping = fan.mapping(distancesM[distancesM.length - 1]);
    double sum = 0.0;
    for (int row = 0; row < rows; row++) {
      double angle = HALF_RAD - 2.0 * HALF_RAD * row / (rows - 1);
      Optional<Branch> branch = mapping.branchAt(angle);
      sum += branch.isPresent() ? branch.get().elevationM(angle) : 0.0;
    }
    return sum;
  }

  /** Traces the rays that a fan kept, one after the other. */
  int again(RayFan fan) {
    RayTracer tracer =
        new RayTracer(air, SightPath.level(), distancesM, true, RayTracer.DEFAULT_TOLERANCE_M);
    int steps = 0;
    for (int i = 0; i < fan.rayCount(); i++) {
      double angle = -HALF_RAD + 2.0 * HALF_RAD * i / (fan.rayCount() - 1);
      steps += tracer.trace(HotGround.CAMERA_M, angle).steps();
    }
    return steps;
  }
}
