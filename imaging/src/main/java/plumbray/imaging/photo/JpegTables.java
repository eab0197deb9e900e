package plumbray.imaging.photo;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import javax.imageio.metadata.IIOInvalidTreeException;
import javax.imageio.metadata.IIOMetadata;
import javax.imageio.metadata.IIOMetadataNode;
import javax.imageio.plugins.jpeg.JPEGQTable;
import org.w3c.dom.NodeList;
import plumbray.imaging.metadata.Resolution;

/**
 * Tells the runtime's JPEG encoder which quantisation and sub-sampling to use: those of the photo's
 * own file, unless told otherwise. With the same tables, what was not moved loses next to nothing
 * more.
 */
final class JpegTables {
  static final double QUALITY = 0.97;
  private static final int JFIF_DENSITY_MOST = 65535;

  private final Photo photo;
  private final WriteOptions options;
  private final Optional<JpegCoding> source;

  JpegTables(Photo photo, WriteOptions options) {
    this.photo = photo;
    this.options = options;
    this.source =
        photo
            .metadata()
            .coding()
            .jpeg()
            .filter(coding -> coding.components().size() == photo.channels());
  }

  void applyTo(IIOMetadata metadata, Optional<Resolution> resolution)
      throws IIOInvalidTreeException {
    String format = metadata.getNativeMetadataFormatName();
    IIOMetadataNode root = (IIOMetadataNode) metadata.getAsTree(format);
    IIOMetadataNode frame = only(root, "sof");
    List<JPEGQTable> tables = new ArrayList<>();
    for (int i = 0; i < photo.channels(); i++) {
      IIOMetadataNode component =
          (IIOMetadataNode) frame.getElementsByTagName("componentSpec").item(i);
      component.setAttribute("HsamplingFactor", String.valueOf(across(i)));
      component.setAttribute("VsamplingFactor", String.valueOf(down(i)));
      component.setAttribute("QtableSelector", String.valueOf(selector(table(i), tables)));
    }
    setTables(root, tables);
    resolution.ifPresent(r -> setDensity(only(root, "app0JFIF"), r));
    metadata.setFromTree(format, root);
  }

  private int across(int component) {
    if (options.jpegSampling().isPresent() || source.isEmpty()) {
      JpegSampling sampling = options.jpegSampling().orElse(JpegSampling.QUARTER);
      return photo.channels() == 1 || component > 0 ? 1 : sampling.across();
    }
    return source.get().components().get(component).across();
  }

  private int down(int component) {
    if (options.jpegSampling().isPresent() || source.isEmpty()) {
      JpegSampling sampling = options.jpegSampling().orElse(JpegSampling.QUARTER);
      return photo.channels() == 1 || component > 0 ? 1 : sampling.down();
    }
    return source.get().components().get(component).down();
  }

  private int[] table(int component) {
    if (options.jpegQuality().isEmpty() && source.filter(JpegCoding::isComplete).isPresent()) {
      JpegCoding coding = source.get();
      return coding.tables().get(coding.components().get(component).table());
    }
    JPEGQTable standard = component == 0 ? JPEGQTable.K1Luminance : JPEGQTable.K2Chrominance;
    return standard
        .getScaledInstance(scale(options.jpegQuality().orElse(QUALITY)), true)
        .getTable();
  }

  /**
   * Factor on the tables of ITU-T T.81, annex K, for a quality: 1 / (2 q) below one half, 2 - 2 q
   * above. Common practice of JPEG encoders, no source.
   */
  private static float scale(double quality) {
    double q = Math.max(0.01, quality);
    return (float) (q < 0.5 ? 0.5 / q : 2.0 - 2.0 * q);
  }

  /** The number of a table in the list, where it is put if it is not there. */
  private static int selector(int[] table, List<JPEGQTable> tables) {
    for (int i = 0; i < tables.size(); i++) {
      if (Arrays.equals(tables.get(i).getTable(), table)) {
        return i;
      }
    }
    tables.add(new JPEGQTable(table));
    return tables.size() - 1;
  }

  private static void setTables(IIOMetadataNode root, List<JPEGQTable> tables) {
    IIOMetadataNode segment = only(root, "dqt");
    NodeList old = segment.getElementsByTagName("dqtable");
    for (int i = 0; i < old.getLength(); i++) {
      segment.removeChild(old.item(i));
    }
    for (int i = 0; i < tables.size(); i++) {
      IIOMetadataNode table = new IIOMetadataNode("dqtable");
      table.setAttribute("elementPrecision", "0");
      table.setAttribute("qtableId", String.valueOf(i));
      table.setUserObject(tables.get(i));
      segment.appendChild(table);
    }
  }

  private static void setDensity(IIOMetadataNode header, Resolution given) {
    Resolution stored =
        given.unit() == Resolution.Unit.METRE ? given.in(Resolution.Unit.INCH) : given;
    long across = Math.round(stored.across());
    long down = Math.round(stored.down());
    if (across >= 1 && down >= 1 && Math.max(across, down) <= JFIF_DENSITY_MOST) {
      String unit =
          switch (stored.unit()) {
            case INCH -> "1";
            case CENTIMETRE -> "2";
            default -> "0";
          };
      header.setAttribute("resUnits", unit);
      header.setAttribute("Xdensity", String.valueOf(across));
      header.setAttribute("Ydensity", String.valueOf(down));
    }
  }

  private static IIOMetadataNode only(IIOMetadataNode root, String name) {
    return (IIOMetadataNode) root.getElementsByTagName(name).item(0);
  }
}
