package plumbray.cli.work;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.cli.document.Digest;
import plumbray.cli.document.MappingCsv;
import plumbray.cli.document.ProgramVersion;
import plumbray.cli.document.SightReader;
import plumbray.cli.document.TemperatureCsv;
import plumbray.cli.document.WholeFile;
import plumbray.cli.report.Provenance;
import plumbray.cli.report.SightReport;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.StretchTemperatures;
import plumbray.imaging.fit.TemperatureRow;
import plumbray.imaging.measure.MappingRow;

/**
 * Says what the air does to a sight, without a photo. Quantities that are to be estimated count at
 * their values, and with the uncertainty of what is known of them beforehand, where that is given.
 */
public final class TraceWorker {
  private TraceWorker() {}

  /**
   * Writes the mapping, the temperature against height, and the page that shows both.
   *
   * @param sightFile the sight file
   * @param files where the results go
   * @return what can be seen at each distance in use
   * @throws IOException when a file cannot be written
   */
  public static List<SightLine> trace(Path sightFile, ResultFiles files) throws IOException {
    byte[] text = SightReader.bytes(sightFile);
    Sight sight = SightReader.read(sightFile.toString(), text);
    Estimates known = knownBeforehand(sight);
    SightOptics optics = Tracing.optics(sightFile, sight, known.names());
    WholeFile.write(files.mapping(), MappingCsv.text(MappingRow.of(optics, known)));
    WholeFile.write(
        files.temperatures(),
        TemperatureCsv.text(TemperatureRow.of(sight, known), StretchTemperatures.of(sight, known)));
    Digest input = Digest.of(sightFile.getFileName().toString(), text);
    Provenance provenance = new Provenance(List.of(input), ProgramVersion.name());
    WholeFile.write(files.page(), new SightReport(files.name(), sight, known, provenance).html());
    return SightLine.of(optics);
  }

  private static Estimates knownBeforehand(Sight sight) {
    List<Parameter> known =
        SightParameters.of(sight).parameters().stream()
            .filter(parameter -> !Double.isNaN(parameter.sigma()))
            .toList();
    double[][] covariance = new double[known.size()][known.size()];
    for (int i = 0; i < covariance.length; i++) {
      covariance[i][i] = Math.pow(known.get(i).sigma(), 2);
    }
    return Estimates.of(
        known.stream().map(Parameter::name).toList(),
        known.stream().mapToDouble(Parameter::value).toArray(),
        covariance);
  }
}
