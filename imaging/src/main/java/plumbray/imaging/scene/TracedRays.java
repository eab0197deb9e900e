package plumbray.imaging.scene;

import java.util.Optional;
import java.util.OptionalDouble;
import plumbray.raymodel.mapping.Branch;
import plumbray.raymodel.mapping.RayFan;
import plumbray.raymodel.mapping.SightMapping;

/**
 * The rays of a traced fan.
 *
 * @param fan the fan
 */
record TracedRays(RayFan fan) implements Rays {
  @Override
  public AtDistance at(double distanceM) {
    return new Mapped(fan.mapping(distanceM));
  }

  @Override
  public OptionalDouble groundDistanceM(double apparentRad) {
    return fan.ground().distanceM(apparentRad);
  }

  private record Mapped(SightMapping mapping) implements AtDistance {
    @Override
    public double groundM() {
      return mapping.groundM();
    }

    @Override
    public void evaluate(double apparentRad, double[] out) {
      Optional<Branch> branch = mapping.branchAt(apparentRad);
      out[0] = branch.isPresent() ? branch.get().elevationM(apparentRad) : Double.NaN;
      out[1] = branch.isPresent() ? branch.get().pathSlope(apparentRad) : Double.NaN;
    }
  }
}
