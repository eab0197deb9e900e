package plumbray.cli.document;

import java.io.IOException;
import java.nio.file.DirectoryIteratorException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.regex.PatternSyntaxException;

/**
 * The photos that a name or a pattern such as {@code day1/*.jpg} stands for. A pattern stands in
 * the last part of the path. It passes over hidden files and over the program's own pictures
 * ({@code NAME.rectified.EXT}, {@code NAME.mask.png}), so that results may lie beside the photos.
 */
final class PhotoPattern {
  private static final String WHAT = "a photo's file, or a pattern of files";
  private static final String GLOB = ".*[*?\\[{].*";

  private final Path folder;
  private final Node file;

  PhotoPattern(Path folder, Node file) {
    this.folder = folder;
    this.file = file;
  }

  /**
   * The files by rising name; a plain name stands for itself, whether there is such a file or not.
   */
  List<Path> matches() {
    String text = file.text(WHAT);
    int slash = text.lastIndexOf('/');
    String last = text.substring(slash + 1);
    if (last.isEmpty()) {
      throw file.wrong("a file's name", WHAT);
    }
    try {
      Path place = folder.resolve(text.substring(0, slash + 1));
      boolean plain = !last.matches(GLOB) || Files.exists(place.resolve(last));
      return plain ? List.of(place.resolve(last)) : matches(place, last);
    } catch (InvalidPathException e) {
      throw file.wrong("a file's name on this system", WHAT);
    }
  }

  private List<Path> matches(Path place, String glob) {
    List<Path> matches = new ArrayList<>();
    try (DirectoryStream<Path> stream = Files.newDirectoryStream(place, glob)) {
      for (Path match : stream) {
        if (isPhoto(match)) {
          matches.add(match);
        }
      }
    } catch (IOException | DirectoryIteratorException e) {
      throw file.wrong("in a folder that can be read", WHAT);
    } catch (PatternSyntaxException e) {
      throw file.wrong("a pattern of *, ?, [...] and {...}", WHAT);
    }
    if (matches.isEmpty()) {
      throw file.wrong("a pattern that matches a file at least", WHAT);
    }
    matches.sort(Comparator.comparing(match -> match.getFileName().toString()));
    return matches;
  }

  private static boolean isPhoto(Path match) {
    String name = match.getFileName().toString();
    boolean own = name.matches(".*\\.rectified\\.[^.]+") || name.endsWith(".mask.png");
    return !own && !name.startsWith(".") && Files.isRegularFile(match);
  }
}
