package plumbray.cli.work;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import plumbray.calibration.quantity.Parameter;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.SightParameters;
import plumbray.cli.document.ChannelsCsv;
import plumbray.cli.document.Digest;
import plumbray.cli.document.MappingCsv;
import plumbray.cli.document.ProgramVersion;
import plumbray.cli.document.RayTables;
import plumbray.cli.document.SightReader;
import plumbray.cli.document.TemperatureCsv;
import plumbray.cli.document.WholeFile;
import plumbray.cli.report.Provenance;
import plumbray.cli.report.SightFindings;
import plumbray.cli.report.SightReport;
import plumbray.imaging.diagnosis.StretchZones;
import plumbray.imaging.fit.Estimates;
import plumbray.imaging.fit.SightLine;
import plumbray.imaging.fit.SightOptics;
import plumbray.imaging.fit.StretchTemperatures;
import plumbray.imaging.fit.TemperatureRow;
import plumbray.imaging.fit.Warning;
import plumbray.imaging.measure.MappingRow;

/**
 * Says what the air does to a sight, without a photo. Quantities that are to be estimated count at
 * their values, and with the uncertainty of what is known of them beforehand, where that is given.
 */
public final class TraceWorker {
  private TraceWorker() {}

  /**
   * What can be said of a sight in short.
   *
   * @param lines what can be seen at each distance in use
   * @param steep heights at which the air is steeper than autoconvective, over each stretch
   * @param caution why it may not be as exact as it should, where that is so
   */
  public record Traced(
      List<SightLine> lines, List<StretchZones> steep, Optional<Warning> caution) {}

  /**
   * Writes the tables, and the page that shows them.
   *
   * @param sightFile the sight file
   * @param files where the results go
   * @return what to say of it
   * @throws IOException when a file cannot be written
   */
  public static Traced trace(Path sightFile, ResultFiles files) throws IOException {
    byte[] text = SightReader.bytes(sightFile);
    Sight sight = SightReader.read(sightFile.toString(), text);
    Estimates known = knownBeforehand(sight);
    SightOptics optics = Tracing.optics(sightFile, sight, known.names());
    SightFindings findings = SightFindings.of(optics, known);
    writeTables(findings, files);
    Digest input = Digest.of(sightFile.getFileName().toString(), text);
    Provenance provenance = new Provenance(List.of(input), ProgramVersion.name());
    WholeFile.write(files.page(), new SightReport(files.name(), findings, provenance).html());
    return new Traced(findings.lines(), findings.steep(), findings.optics().caution());
  }

  private static void writeTables(SightFindings findings, ResultFiles files) throws IOException {
    SightOptics optics = findings.optics();
    Sight sight = optics.sight();
    Estimates known = findings.known();
    WholeFile.write(files.mapping(), MappingCsv.text(MappingRow.of(optics, known)));
    WholeFile.write(
        files.temperatures(),
        TemperatureCsv.text(TemperatureRow.of(sight, known), StretchTemperatures.of(sight, known)));
    WholeFile.write(files.felt(), RayTables.felt(findings.targets()));
    WholeFile.write(files.bends(), RayTables.bends(findings.targets()));
    WholeFile.write(files.rays(), RayTables.rays(findings.targets()));
    WholeFile.write(files.steep(), RayTables.steep(findings.steep()));
    if (!findings.channels().isEmpty()) {
      WholeFile.write(files.channels(), ChannelsCsv.text(findings.channels()));
    }
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
