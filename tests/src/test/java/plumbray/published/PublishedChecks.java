package plumbray.published;

import java.util.List;
import java.util.stream.Stream;

/** All topics. */
final class PublishedChecks {

  private PublishedChecks() {}

  static Stream<PublishedCheck> all() {
    return Stream.of(
            CiddorIndex.checks(),
            LaboratoryIndex.checks(),
            HandyIndex.checks(),
            WaterVapour.checks(),
            HydrostaticBalance.checks(),
            FlatClosedForms.checks(),
            SphereClosedForms.checks(),
            HotGroundMapping.checks(),
            HotRoadMapping.checks(),
            SurveyorsCoefficient.checks(),
            SightSag.checks(),
            SeaHorizon.checks(),
            GrazingAngles.checks(),
            SurfaceLayer.checks(),
            SlopingLevelling.checks(),
            StandardAtmosphere.checks(),
            TwoLayerAtmosphere.checks())
        .flatMap(List::stream);
  }
}
