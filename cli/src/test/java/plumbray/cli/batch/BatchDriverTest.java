package plumbray.cli.batch;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import plumbray.calibration.sight.Sight;
import plumbray.cli.document.BatchReader;
import plumbray.cli.document.Digest;
import plumbray.cli.work.Fitting;
import plumbray.cli.work.PhotoTask;
import plumbray.cli.work.PhotoWorker;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.FitResult;
import plumbray.imaging.fit.FitStatus;
import plumbray.imaging.fit.Residuals;
import plumbray.imaging.photo.Photo;
import plumbray.imaging.photo.PhotoBuilder;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoMetadata;
import plumbray.imaging.photo.PhotoShape;
import plumbray.imaging.photo.PhotoWriter;
import plumbray.imaging.rectify.Interpolation;
import plumbray.imaging.rectify.RedrawOptions;

/**
 * Small invented photos and a fit that finds what the sight says already: what is tested is the
 * driver.
 */
class BatchDriverTest {
  private static final int WIDTH = 40;
  private static final int HEIGHT = 60;

  @TempDir Path photos;
  @TempDir Path out;

  @BeforeEach
  void photosAndSightsLieInTheFolder() throws IOException, PhotoException {
    Files.writeString(photos.resolve("a.sight.json"), sight(20));
    for (int i = 0; i < 4; i++) {
      PhotoWriter.write(photo(i), photos.resolve("p" + i + ".png"));
    }
  }

  private static String sight(int temperatureC) {
    return """
        {"format": "plumbray-sight/1", "name": "an invented sight",
         "camera": {"widthPx": 40, "heightPx": 60, "focalLengthMm": 100, "pixelPitchUm": 50,
                    "heightM": 2, "pitchMrad": 0},
         "air": {"temperatureC": %d},
         "profile": {"family": "exponential", "surfaceExcessK": 15, "scaleHeightM": 0.3},
         "references": [{"name": "post", "distanceM": 500,
                         "points": [{"heightM": 1, "pixel": [20, 31], "sigmaPx": 0.3}]}]}
        """
        .formatted(temperatureC);
  }

  private static Photo photo(int seed) {
    PhotoBuilder builder = new PhotoBuilder(new PhotoShape(WIDTH, HEIGHT, 1, 8));
    for (int y = 0; y < HEIGHT; y++) {
      for (int x = 0; x < WIDTH; x++) {
        builder.sample(x, y, 0, (x * 5 + y * 3 + seed * 17) % 256);
      }
    }
    return builder.build();
  }

  private static FitResult agreeing(Sight sight, Optional<Photo> photo) {
    return new FitResult(
        FitStatus.GOOD,
        Optional.empty(),
        List.of(),
        sight,
        sight,
        Estimates.none(),
        new Residuals(1, 0.1, 1.0, 1),
        List.of(),
        List.of(),
        0.0);
  }

  private List<PhotoTask> tasks(String list) throws IOException {
    Path batch = photos.resolve("day.batch.json");
    Files.writeString(
        batch,
        "{\"format\": \"plumbray-batch/1\", \"sight\": \"a.sight.json\", \"photos\": ["
            + list
            + "]}");
    return BatchReader.read(batch).stream().map(PhotoTask::of).toList();
  }

  private List<PhotoOutcome> run(Fitting fitting, int jobs, Path folder, List<PhotoTask> tasks)
      throws IOException {
    PhotoWorker worker = new PhotoWorker(fitting, Optional.of(RedrawOptions.standard()), 1);
    return new BatchDriver(worker, folder, jobs, (outcome, finished, total) -> {})
        .run("day", List.of(), tasks);
  }

  private List<PhotoOutcome> run(List<PhotoTask> tasks) throws IOException {
    return run(BatchDriverTest::agreeing, 2, out, tasks);
  }

  private static Map<String, Digest> digests(Path folder) throws IOException {
    Map<String, Digest> digests = new TreeMap<>();
    try (Stream<Path> files = Files.list(folder)) {
      for (Path file : files.toList()) {
        digests.put(file.getFileName().toString(), Digest.of(file));
      }
    }
    return digests;
  }

  @Test
  void everyPhotoHasItsFilesAndTheBatchItsOwn() throws IOException {
    List<PhotoOutcome> outcomes = run(tasks("{\"file\": \"p*.png\"}"));
    assertThat(outcomes).hasSize(4).noneMatch(PhotoOutcome::failed);
    assertThat(digests(out).keySet())
        .contains("p0.fit.json", "p0.rectified.png", "p0.mask.png", "p0.mapping.csv")
        .contains("p3.fit.json", "summary.csv", "batch.log", "index.html", "p0.html")
        .noneMatch(name -> name.endsWith(".part"));
    assertThat(Files.readAllLines(out.resolve("summary.csv"))).hasSize(5);
    assertThat(Files.readString(out.resolve("batch.log"))).endsWith("4 of 4 photos are finished\n");
  }

  @Test
  void whatGoesWrongWithOnePhotoStopsNoOther() throws IOException {
    Files.writeString(photos.resolve("p1.png"), "this is no picture");
    List<PhotoTask> tasks = tasks("{\"file\": \"p*.png\"}, {\"file\": \"missing.jpg\"}");
    Fitting stumbling =
        (sight, photo) -> {
          if (photo.orElseThrow().sample(0, 0, 0) == 34) {
            throw new IllegalStateException("stumbled");
          }
          return agreeing(sight, photo);
        };
    List<PhotoOutcome> outcomes = run(stumbling, 2, out, tasks);
    assertThat(outcomes)
        .extracting(PhotoOutcome::failed)
        .containsExactly(false, true, true, false, true);
    assertThat(outcomes.get(2).error().orElseThrow())
        .isEqualTo("this should not have happened: java.lang.IllegalStateException: stumbled");
    assertThat(Files.exists(out.resolve("p1.rectified.png"))).isFalse();
    assertThat(Files.readString(out.resolve("p1.fit.json"))).contains("\"failed\"");
    assertThat(Files.readAllLines(out.resolve("summary.csv"))).hasSize(6);
  }

  @Test
  void aSecondRunKeepsWhatIsThere() throws IOException {
    List<PhotoTask> tasks = tasks("{\"file\": \"p*.png\"}");
    run(tasks);
    Map<String, Digest> before = digests(out);
    List<PhotoOutcome> again =
        run((sight, photo) -> FitResult.failed(sight, "fitted again"), 2, out, tasks);
    assertThat(again).allMatch(PhotoOutcome::kept).noneMatch(PhotoOutcome::failed);
    Map<String, Digest> after = digests(out);
    before.remove("batch.log");
    after.remove("batch.log");
    assertThat(after).isEqualTo(before);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"p2.fit.json", "p2.rectified.png", "p2.mask.png", "p2.mapping.csv", "p2.html"})
  void aMissingOrDamagedFileIsMadeAgain(String name) throws IOException {
    List<PhotoTask> tasks = tasks("{\"file\": \"p*.png\"}");
    run(tasks);
    Map<String, Digest> before = digests(out);
    byte[] whole = Files.readAllBytes(out.resolve(name));
    Files.write(out.resolve(name), Arrays.copyOf(whole, whole.length / 2));
    assertThat(run(tasks)).extracting(PhotoOutcome::kept).containsExactly(true, true, false, true);
    Files.delete(out.resolve(name));
    assertThat(run(tasks)).extracting(PhotoOutcome::kept).containsExactly(true, true, false, true);
    Map<String, Digest> after = digests(out);
    before.remove("batch.log");
    after.remove("batch.log");
    assertThat(after).isEqualTo(before);
  }

  @Test
  void aChangedPhotoSightOrAirIsWorkedOnAgain() throws IOException, PhotoException {
    run(tasks("{\"file\": \"p*.png\"}"));
    PhotoWriter.write(photo(9), photos.resolve("p0.png"));
    List<PhotoTask> warmer =
        tasks(
            "{\"file\": \"p0.png\"}, {\"file\": \"p1.png\", \"air\": {\"temperatureC\": 30}},"
                + " {\"file\": \"p2.png\"}");
    assertThat(run(warmer)).extracting(PhotoOutcome::kept).containsExactly(false, false, true);
    assertThat(run(warmer)).allMatch(PhotoOutcome::kept);
    Files.writeString(photos.resolve("a.sight.json"), sight(25));
    assertThat(run(tasks("{\"file\": \"p*.png\"}"))).noneMatch(PhotoOutcome::kept);
  }

  @Test
  void resultsDoNotDependOnHowManyPhotosAreWorkedOnAtATime(@TempDir Path other) throws IOException {
    List<PhotoTask> tasks = tasks("{\"file\": \"p*.png\"}");
    run(BatchDriverTest::agreeing, 1, out, tasks);
    run(BatchDriverTest::agreeing, 4, other, tasks);
    assertThat(digests(other)).isEqualTo(digests(out));
  }

  @Test
  void aPhotoOfAnotherSizeFailsWithBothSizes() throws IOException, PhotoException {
    Photo small = new PhotoBuilder(new PhotoShape(30, 60, 1, 8)).build();
    PhotoWriter.write(small, photos.resolve("p1.png"));
    PhotoOutcome outcome = run(tasks("{\"file\": \"p1.png\"}")).get(0);
    assertThat(outcome.error().orElseThrow())
        .isEqualTo(
            photos.resolve("p1.png")
                + ": is 30 x 60 px, must be 40 x 60 px (size of the sight's photos); use the sight of"
                + " this photo's camera");
  }

  @Test
  void aBrokenColourProfileMakesAFitDoubtful() throws IOException, PhotoException {
    Photo broken =
        photo(2).withMetadata(PhotoMetadata.none().withIccProfile(new byte[] {1, 2, 3, 4}));
    PhotoWriter.write(broken, photos.resolve("p1.png"));
    PhotoOutcome outcome = run(tasks("{\"file\": \"p1.png\"}")).get(0);
    assertThat(outcome.status()).isEqualTo(FitStatus.DOUBTFUL);
    assertThat(Files.readString(out.resolve("p1.fit.json")))
        .contains("\"colour-profile\"", "values are taken as sRGB-encoded.");
  }

  @Test
  void progressCountsEveryPhotoOnce() throws IOException {
    List<Integer> counts = new ArrayList<>();
    PhotoWorker worker =
        new PhotoWorker(BatchDriverTest::agreeing, Optional.of(RedrawOptions.standard()), 1);
    new BatchDriver(worker, out, 2, (outcome, finished, total) -> counts.add(finished))
        .run("day", List.of(), tasks("{\"file\": \"p*.png\"}"));
    assertThat(counts).containsExactly(1, 2, 3, 4);
  }

  @Test
  void aPhotoIsRedrawnAgainWhereItIsToBeDrawnOtherwise() throws IOException {
    List<PhotoTask> tasks = tasks("{\"file\": \"p0.png\"}");
    run(tasks);
    RedrawOptions sharper = new RedrawOptions(Interpolation.LANCZOS, false);
    PhotoWorker worker = new PhotoWorker(BatchDriverTest::agreeing, Optional.of(sharper), 1);
    BatchDriver driver = new BatchDriver(worker, out, 1, (outcome, finished, total) -> {});
    assertThat(driver.run("day", List.of(), tasks).get(0).kept()).isFalse();
    assertThat(driver.run("day", List.of(), tasks).get(0).kept()).isTrue();
  }
}
