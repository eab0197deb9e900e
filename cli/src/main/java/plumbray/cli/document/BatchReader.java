package plumbray.cli.document;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import plumbray.calibration.sight.Sight;

/**
 * Reads a batch file, format {@code plumbray-batch/1}: the photos, the sight of each, and what was
 * different about the air when it was taken.
 */
public final class BatchReader {
  /** The tag in a batch file's {@code format}. */
  public static final String FORMAT = "plumbray-batch/1";

  private static final String INDEX = "index";
  private static final List<String> KEYS = List.of("format", "sight", "photos");
  private static final List<String> PHOTO_KEYS = List.of("file", "air", "sight");
  private static final String SIGHT = "the sight file of the photos";

  private final Node root;
  private final Path folder;
  private final Map<Path, Source> sources = new HashMap<>();
  private final Map<String, Path> taken = new HashMap<>();
  private final List<BatchPhoto> photos = new ArrayList<>();

  private record Source(Node root, Digest digest) {}

  private BatchReader(Node root, Path folder) {
    this.root = root;
    this.folder = folder;
  }

  /**
   * Reads a batch file and every sight file it names.
   *
   * @param path the batch file; the paths in it start from its folder
   * @return the photos, in the file's order, those of a pattern in the order of their names
   * @throws InputException when the batch file or one of the sight files is wrong
   */
  public static List<BatchPhoto> read(Path path) {
    BatchReader reader =
        new BatchReader(JsonText.read(path), path.toAbsolutePath().normalize().getParent());
    return reader.photos();
  }

  private List<BatchPhoto> photos() {
    root.onlyKeys("a batch file", KEYS);
    root.get("format", "the file's format").choice("the file's format", List.of(FORMAT));
    for (Node photo : root.get("photos", "the photos").elements("the photos", 1)) {
      add(photo);
    }
    return photos;
  }

  private void add(Node photo) {
    photo.onlyKeys("a photo of the batch", PHOTO_KEYS);
    Node file = photo.get("file", "a photo's file, or a pattern of files");
    Path sightFile = folder.resolve(sightName(photo));
    Source source = sources.computeIfAbsent(sightFile, BatchReader::source);
    Optional<Node> air = photo.find("air");
    Sight sight = SightReader.read(source.root(), air);
    List<Digest> inputs = new ArrayList<>();
    inputs.add(source.digest());
    air.ifPresent(node -> inputs.add(Digest.of("air of the photo", node.json().toString())));
    for (Path match : new PhotoPattern(folder, file).matches()) {
      String name = BatchPhoto.resultName(match);
      claim(file, name, match);
      photos.add(new BatchPhoto(name, match, sightFile, sight, inputs));
    }
  }

  private String sightName(Node photo) {
    return photo
        .find("sight")
        .or(() -> root.find("sight"))
        .orElseGet(() -> photo.get("sight", SIGHT))
        .text(SIGHT);
  }

  private static Source source(Path sightFile) {
    byte[] text = JsonText.bytes(sightFile);
    String name = sightFile.getFileName().toString();
    return new Source(JsonText.parse(sightFile.toString(), text), Digest.of(name, text));
  }

  private void claim(Node file, String name, Path photo) {
    // Two names that differ in case alone are one file on some systems.
    Path other = taken.putIfAbsent(name.toLowerCase(Locale.ROOT), photo);
    if (other != null) {
      throw file.wrong(
          "the name of "
              + photo.getFileName()
              + ", whose results would overwrite those of "
              + other.getFileName(),
          "a photo of another name",
          "results bear the photo's name; rename one, or put it in a batch of its own");
    }
    if (name.equalsIgnoreCase(INDEX)) {
      throw file.wrong(
          "the name of " + photo.getFileName(),
          "another name than " + INDEX,
          "index.html is the batch's own page");
    }
  }
}
