package plumbray.imaging.rectify;

import plumbray.raymodel.ray.StraightRay;

/** Mappings in closed form. */
final class SampleBranches {
  private SampleBranches() {}

  /** The one image that rays of constant refraction coefficient give. */
  static ApparentBranch constantRefraction(
      StraightRay bent, double distanceM, double lowestRad, double highestRad) {
    return new ApparentBranch() {
      @Override
      public boolean upright() {
        return true;
      }

      @Override
      public double lowestRad() {
        return lowestRad;
      }

      @Override
      public double highestRad() {
        return highestRad;
      }

      @Override
      public double lowestElevationM() {
        return bent.elevationM(lowestRad, distanceM);
      }

      @Override
      public double highestElevationM() {
        return bent.elevationM(highestRad, distanceM);
      }

      @Override
      public double apparentRad(double elevationM) {
        return bent.apparentRad(elevationM, distanceM);
      }

      @Override
      public double pathSlope(double apparentRad) {
        return bent.pathSlope(apparentRad, distanceM);
      }
    };
  }

  /** Straight rays, all seen higher by {@code byRad}. */
  static ApparentBranch shifted(
      StraightRay straight, double distanceM, double byRad, double lowestRad, double highestRad) {
    ApparentBranch plain = constantRefraction(straight, distanceM, lowestRad, highestRad);
    return new ApparentBranch() {
      @Override
      public boolean upright() {
        return true;
      }

      @Override
      public double lowestRad() {
        return lowestRad + byRad;
      }

      @Override
      public double highestRad() {
        return highestRad + byRad;
      }

      @Override
      public double lowestElevationM() {
        return plain.lowestElevationM();
      }

      @Override
      public double highestElevationM() {
        return plain.highestElevationM();
      }

      @Override
      public double apparentRad(double elevationM) {
        return plain.apparentRad(elevationM) + byRad;
      }

      @Override
      public double pathSlope(double apparentRad) {
        return plain.pathSlope(apparentRad - byRad);
      }
    };
  }

  /**
   * A parabola: elevation y = lowestM + (angle from the vanishing line)^2 * bendM, upright above
   * the line, inverted below, down or up to {@code endRad}.
   */
  record Parabola(double lineRad, double lowestM, double bendM, double endRad)
      implements ApparentBranch {
    @Override
    public boolean upright() {
      return endRad > lineRad;
    }

    @Override
    public double lowestRad() {
      return Math.min(lineRad, endRad);
    }

    @Override
    public double highestRad() {
      return Math.max(lineRad, endRad);
    }

    @Override
    public double lowestElevationM() {
      return lowestM;
    }

    @Override
    public double highestElevationM() {
      return lowestM + bendM * (endRad - lineRad) * (endRad - lineRad);
    }

    @Override
    public double apparentRad(double elevationM) {
      double away = Math.sqrt(Math.max(0, elevationM - lowestM) / bendM);
      return upright() ? lineRad + away : lineRad - away;
    }

    @Override
    public double pathSlope(double apparentRad) {
      return apparentRad;
    }
  }
}
