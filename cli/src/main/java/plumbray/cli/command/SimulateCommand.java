package plumbray.cli.command;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;
import plumbray.calibration.sight.Sight;
import plumbray.cli.document.HeldSight;
import plumbray.cli.document.InputException;
import plumbray.cli.document.SceneDocument;
import plumbray.cli.document.SceneReader;
import plumbray.cli.document.SightReader;
import plumbray.cli.document.TruthWriter;
import plumbray.cli.document.WholeFile;
import plumbray.imaging.photo.PhotoException;
import plumbray.imaging.photo.PhotoFormat;
import plumbray.imaging.photo.PhotoShape;
import plumbray.imaging.photo.PhotoWriter;
import plumbray.imaging.scene.Simulation;

/** {@code plumbray simulate}: draws the photo that a sight would give of a described scene. */
@Command(
    name = "simulate",
    description = {
      "Draws the photo that this sight would give of a described scene.",
      "Beside NAME.EXT it writes NAME.truth.json, what is known exactly about the photo, and"
          + " NAME.straight.png, the same view along straight rays."
    },
    sortOptions = false)
final class SimulateCommand implements Callable<Integer> {
  private static final int CHANNELS = 3;

  @ParentCommand private PlumbrayCommand parent;

  @Parameters(
      index = "0",
      paramLabel = "SIGHT",
      description = "Sight file with all quantities held.")
  private Path sightFile;

  @Parameters(index = "1", paramLabel = "SCENE", description = "Scene file.")
  private Path sceneFile;

  @Option(
      names = "--out",
      required = true,
      paramLabel = "PHOTO",
      description = "The photo to write: .jpg, .png or .tif.")
  private Path photoFile;

  @Override
  public Integer call() throws IOException {
    SceneDocument document = SceneReader.read(sceneFile);
    Sight sight = heldSight();
    checkFormat(sight, document);
    Simulation simulation = new Simulation(sight, document.scene());
    WholeFile.folderOf(photoFile);
    parent.terminal().progress("drawing " + photoFile + " ...");
    WholeFile.write(
        beside(".truth.json"), TruthWriter.text(document.name(), sight, simulation.truth()));
    try {
      PhotoWriter.write(simulation.straightPhoto(), beside(".straight.png"));
      PhotoWriter.write(simulation.photo(), photoFile, document.jpegQuality());
    } catch (PhotoException e) {
      throw new InputException(e.getMessage(), e);
    }
    parent.terminal().result(photoFile + " is drawn");
    return ExitStatus.DONE.code();
  }

  private Sight heldSight() {
    Sight sight = SightReader.read(sightFile);
    if (sight.profile().family().isEmpty()) {
      throw new InputException(
          sightFile
              + ": /profile/family is \"best\", must be one family (the air to simulate); name it");
    }
    Optional<String> open = HeldSight.firstOpen(sight);
    if (open.isPresent()) {
      throw new InputException(
          "%s: %s is to be estimated, must be held (what is simulated is known); write its value alone"
              .formatted(sightFile, open.get()));
    }
    return sight;
  }

  /** Tells what the photo's name cannot hold before anything is drawn. */
  private void checkFormat(Sight sight, SceneDocument document) {
    PhotoShape shape =
        new PhotoShape(
            sight.camera().widthPx(),
            sight.camera().heightPx(),
            CHANNELS,
            document.scene().sensor().bits());
    String name = String.valueOf(photoFile.getFileName());
    if (PhotoFormat.ofName(name).filter(format -> format.holds(shape)).isEmpty()) {
      throw new InputException(
          "%s: the ending is not one that holds %d bit, must be .jpg (8 bit only), .png or .tif (the photo to write)"
              .formatted(photoFile, shape.bits()));
    }
  }

  private Path beside(String ending) {
    String name = photoFile.getFileName().toString();
    int dot = name.lastIndexOf('.');
    return photoFile.resolveSibling(name.substring(0, dot) + ending);
  }
}
