package plumbray.cli.batch;

import java.io.IOException;
import java.net.URI;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import plumbray.cli.document.Digest;
import plumbray.cli.document.ProgramVersion;
import plumbray.cli.document.WholeFile;
import plumbray.cli.report.IndexEntry;
import plumbray.cli.report.IndexEntry.PageLink;
import plumbray.cli.report.IndexReport;
import plumbray.cli.report.Provenance;
import plumbray.cli.report.Thumbnail;
import plumbray.cli.work.ResultFiles;

/** Writes the batch's page, which leads to the photos' pages and shows what they show in small. */
final class BatchIndex {
  private final Path folder;

  BatchIndex(Path folder) {
    this.folder = folder;
  }

  void write(String name, List<Digest> inputs, PhotoOutcome[] outcomes) throws IOException {
    List<IndexEntry> entries = new ArrayList<>();
    for (PhotoOutcome outcome : outcomes) {
      entries.add(entry(outcome));
    }
    Provenance provenance = new Provenance(inputs, ProgramVersion.name());
    WholeFile.write(
        folder.resolve("index.html"), new IndexReport(name, entries, provenance).html());
  }

  private IndexEntry entry(PhotoOutcome outcome) throws IOException {
    if (outcome.fit().isEmpty()) {
      return IndexEntry.failed(outcome.photo(), Optional.empty(), outcome.error().orElse(""));
    }
    return IndexEntry.of(outcome.photo(), Optional.of(link(outcome)), outcome.fit().get());
  }

  private PageLink link(PhotoOutcome outcome) throws IOException {
    Path page = new ResultFiles(folder, outcome.name()).page();
    String html = Files.readString(page, StandardCharsets.UTF_8);
    return new PageLink(address(page.getFileName().toString()), Thumbnail.ofPage(html));
  }

  /** A file's name as an address: what would mean something else in one is escaped. */
  private static String address(String name) {
    try {
      return "." + new URI(null, null, "/" + name, null).toASCIIString();
    } catch (URISyntaxException e) {
      throw new IllegalStateException("a path of one part is always an address", e);
    }
  }
}
