package plumbray.imaging.metadata;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import plumbray.imaging.metadata.PhotoOrigin.Fact;
import plumbray.imaging.metadata.PhotoOrigin.Quantity;

class XmpPacketTest {
  private static final PhotoOrigin ORIGIN =
      new PhotoOrigin(
          List.of(new Fact("program", "Plumbray 9"), new Fact("status", "good & <sound>")),
          List.of(
              new Quantity("profile.surfaceExcessK", 12.5, 0.25),
              new Quantity("profile.scaleHeightM", 1e-5, Double.NaN)),
          List.of("first", "second"));

  private static final String SOURCE =
      """
      <?xpacket begin="\ufeff" id="W5M0MpCehiHzreSzNTczkc9d"?>
      <x:xmpmeta xmlns:x="adobe:ns:meta/">
       <rdf:RDF xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#">
        <rdf:Description rdf:about="uuid:7" xmlns:dc="http://purl.org/dc/elements/1.1/"
          xmlns:tiff="http://ns.adobe.com/tiff/1.0/" tiff:Orientation="6" tiff:Make="Küwe">
         <dc:title><rdf:Alt><rdf:li xml:lang="x-default">Kiln</rdf:li></rdf:Alt></dc:title>
        </rdf:Description>
        <rdf:Description rdf:about="uuid:7" xmlns:exif="http://ns.adobe.com/exif/1.0/"
          xmlns:xmp="http://ns.adobe.com/xap/1.0/">
         <exif:PixelXDimension>120</exif:PixelXDimension>
         <xmp:Thumbnails><rdf:Alt><rdf:li>old</rdf:li></rdf:Alt></xmp:Thumbnails>
        </rdf:Description>
       </rdf:RDF>
      </x:xmpmeta>
      <?xpacket end="w"?>""";

  @TempDir Path folder;

  @Test
  void whatThePacketSaidStaysAndTheOriginIsAdded() {
    XmpPacket packet = XmpPacket.read(SOURCE.getBytes(StandardCharsets.UTF_8)).orElseThrow();
    packet.setRedrawn(80, 60);
    packet.setOrigin(ORIGIN);
    String text = text(packet);
    assertThat(text)
        .startsWith("<?xpacket begin=\"\ufeff\"")
        .endsWith("<?xpacket end=\"w\"?>")
        .contains("Kiln", "tiff:Make=\"Küwe\"", "tiff:Orientation=\"1\"")
        .contains("<exif:PixelXDimension>80</exif:PixelXDimension>")
        .contains("<plumbray:program>Plumbray 9</plumbray:program>", "good &amp; &lt;sound&gt;")
        .contains("<plumbray:name>profile.surfaceExcessK</plumbray:name>")
        .contains("<plumbray:value>12.5</plumbray:value><plumbray:sigma>0.25</plumbray:sigma>")
        // ISO 16684-1, 8.2.1.4: a Real has no exponent
        .contains("<plumbray:value>0.000010</plumbray:value></rdf:li>")
        .contains("xmlns:plumbray=\"" + PhotoOrigin.NAMESPACE + "\" rdf:about=\"uuid:7\">")
        .doesNotContain("Thumbnails");
  }

  @Test
  void aSecondOriginTakesThePlaceOfTheFirst() {
    XmpPacket packet = XmpPacket.empty();
    packet.setOrigin(ORIGIN);
    XmpPacket again = XmpPacket.read(packet.bytes()).orElseThrow();
    again.setOrigin(
        new PhotoOrigin(List.of(new Fact("program", "Plumbray 10")), List.of(), List.of()));
    assertThat(text(again)).contains("Plumbray 10").doesNotContain("Plumbray 9", "surfaceExcessK");
    assertThat(text(again).split("rdf:Description ", -1)).hasSize(2);
  }

  @Test
  void whatIsNotNotedIsNotAdded() {
    XmpPacket packet = XmpPacket.empty();
    packet.setRedrawn(10, 10);
    assertThat(text(packet)).doesNotContain("Orientation", "Dimension");
  }

  @Test
  void aPacketCannotMakeTheProgramOpenAFile() throws Exception {
    Path secret = Files.writeString(folder.resolve("secret.txt"), "secret words");
    String hostile =
        "<!DOCTYPE x [<!ENTITY e SYSTEM \"%s\">]>".formatted(secret.toUri())
            + "<rdf:RDF xmlns:rdf='http://www.w3.org/1999/02/22-rdf-syntax-ns#'>&e;</rdf:RDF>";
    assertThat(XmpPacket.read(hostile.getBytes(StandardCharsets.UTF_8))).isEmpty();
  }

  @Test
  void whatIsNoRdfIsNotRead() {
    for (String text : List.of("", "no xml", "<a/>", "<rdf:RDF>", SOURCE.substring(0, 400))) {
      assertThat(XmpPacket.read(text.getBytes(StandardCharsets.UTF_8))).as(text).isEmpty();
    }
  }

  @Test
  void zerosAtTheEndDoNoHarm() {
    byte[] padded = (SOURCE + "\0\0\0").getBytes(StandardCharsets.UTF_8);
    assertThat(XmpPacket.read(padded)).isPresent();
  }

  private static String text(XmpPacket packet) {
    return new String(packet.bytes(), StandardCharsets.UTF_8);
  }
}
