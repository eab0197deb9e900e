package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PointsReaderTest {
  @Test
  void columnsAreFoundByTheirNames() {
    List<PointsReader.Point> points =
        PointsReader.read(
            "p.csv",
            "v,u,name,distance_m,sigma_px\r\n2.5,1.5,\"a \"\"b\"\", c\",640,0.25\r\n4,3,d,,\r\n");
    assertThat(points).hasSize(2);
    assertThat(points.get(0).name()).isEqualTo("a \"b\", c");
    assertThat(points.get(0).u()).isEqualTo(1.5);
    assertThat(points.get(0).v()).isEqualTo(2.5);
    assertThat(points.get(0).distanceM()).hasValue(640.0);
    assertThat(points.get(0).sigmaPx()).hasValue(0.25);
    assertThat(points.get(1).distanceM()).isEmpty();
  }

  @Test
  void linesMayEndWithALineFeedAlone() {
    assertThat(PointsReader.read("p.csv", "name,u,v\n\"x\ny\",1,2\n\nz,3,4")).hasSize(2);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "|is empty, must start with the header name,u,v",
        "name;u;v|line 1 is a header with column \"name;u;v\", must be one of name, u, v,"
            + " distance_m, sigma_px",
        "name,u,u,v|line 1 is a header with column \"u\" twice, must be each column once",
        "name,u|line 1 is a header with no column v, must be name,u,v and, where known,"
            + " distance_m, sigma_px",
        "name,u,v/a,1|line 2 is a record of 2 fields, must be of 3, as the header",
        "name,u,v/a,1,|line 2, column v is empty, must be a number",
        "name,u,v/a,1,x2|line 2, column v is \"x2\", must be -1000000 to 1000000 px (pixel of the"
            + " point)",
        "name,u,v/a,1,NaN|line 2, column v is \"NaN\", must be -1000000 to 1000000 px (pixel of the"
            + " point)",
        "name,u,v/a,1,0x1p3|line 2, column v is \"0x1p3\", must be -1000000 to 1000000 px (pixel of"
            + " the point)",
        "name,u,v,distance_m/a,1,2,-5|line 2, column distance_m is \"-5\", must be 0.1 to 200000 m"
            + " (distance from the camera along the ground)",
        "name,u,v/\"a,1,2|line 2: a quote is not closed, must be before the file ends",
        "name,u,v/a\"b,1,2|line 2: a quote stands inside a field, must be at its start",
        "name,u,v/\"a\"b,1,2|line 2: text follows a closing quote, must be a comma or the end",
      })
  void mistakesAreSaidWithTheirLine(String text, String message) {
    String lines = text == null ? "" : text.replace('/', '\n');
    assertThatThrownBy(() -> PointsReader.read("p.csv", lines))
        .isInstanceOf(InputException.class)
        .hasMessage("p.csv: " + message);
  }
}
