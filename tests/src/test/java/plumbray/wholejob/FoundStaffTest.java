package plumbray.wholejob;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.ImageBox;
import plumbray.calibration.sight.Reference;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StaffTarget;
import plumbray.cli.document.SightReader;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.SightFit;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoReader;

/** Staffs of which the sight does not say where they are in the sample photos. */
class FoundStaffTest {
  private static final Path FOLDER = Path.of("..", "sample-images");
  private static final double SIGMAS = 3.0;

  private static Sight sight(String name) throws Exception {
    return SightReader.read(FOLDER.resolve(name + ".sight.json"));
  }

  private static Sight unplaced(Sight sight, StaffTarget staff) {
    Reference first = sight.references().get(0);
    return sight.withReferences(
        List.of(
            new Reference(
                first.name(), first.distanceM(), Quantity.held(0.0), staff, Optional.empty())));
  }

  @ParameterizedTest
  @ValueSource(strings = {"noon", "overcast"})
  void theStaffIsFoundWhereTheSightHadMarkedItAndFitsAsWell(String name) throws Exception {
    Sight marked = sight(name);
    StaffTarget staff = (StaffTarget) marked.references().get(0).kind();
    Photo photo = PhotoReader.read(FOLDER.resolve(name + ".jpg"));
    FitResult result = new SightFit().fit(unplaced(marked, staff), Optional.of(photo));
    assertThat(result.status()).as("%s", result.warnings()).isEqualTo(FitStatus.GOOD);
    assertThat(result.warnings()).anyMatch(w -> w.code().equals("reference-found"));
    ImageBox right = marked.references().get(0).imageBox().orElseThrow();
    ImageBox found = result.asked().references().get(0).imageBox().orElseThrow();
    double middle = 0.5 * (right.u0() + right.u1());
    assertThat(middle).isBetween(found.u0(), found.u1());
    // the marked box lies within the bars; the bars are not much wider
    assertThat(found.u1() - found.u0())
        .isBetween(right.u1() - right.u0() - 2.0, 2.0 * (right.u1() - right.u0()));
    assertThat(found.v0()).isLessThan(right.v0() + 10.0);
    Sight truth = SightReader.read(FOLDER.resolve(name + ".truth.sight.json"));
    int pitch = result.estimates().names().indexOf("camera.pitchRad");
    assertThat(result.estimates().values()[pitch])
        .isCloseTo(
            truth.camera().pitchRad().value(), within(SIGMAS * result.estimates().sigmas()[pitch]));
  }

  @Test
  void aStaffThatIsNotInThePhotoIsNotFound() throws Exception {
    double[] other = {0, 0.31, 0.38, 0.9, 0.97, 1.1, 1.64, 1.7, 2.3, 2.4};
    Photo photo = PhotoReader.read(FOLDER.resolve("overcast.jpg"));
    FitResult result =
        new SightFit()
            .fit(unplaced(sight("overcast"), new StaffTarget(other, true)), Optional.of(photo));
    assertThat(result.status()).isEqualTo(FitStatus.FAILED);
    assertThat(result.error().orElseThrow()).contains("imageBox").doesNotContain("\n");
  }
}
