package plumbray.benchmark;

import plumbray.raymodel.path.SightPath;
import plumbray.raymodel.ray.Medium;
import plumbray.raymodel.ray.RayTrace;
import plumbray.raymodel.ray.RayTracer;

/** The fan by the program's tracer, with derivatives by the medium's parameters. */
record OwnRays(Medium air) implements Tracing {

  @Override
  public double[] heightsM(double tolerance) {
    RayTracer tracer =
        new RayTracer(air, SightPath.level(), new double[] {HotGround.REACH_M}, true, tolerance);
    double[] heights = new double[HotGround.RAYS];
    for (int i = 0; i < heights.length; i++) {
      RayTrace ray = tracer.trace(HotGround.CAMERA_M, HotGround.angleRad(i));
      heights[i] = ray.elevationM(0);
    }
    return heights;
  }
}
