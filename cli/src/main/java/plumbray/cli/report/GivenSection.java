package plumbray.cli.report;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import plumbray.calibration.quantity.Quantity;
import plumbray.calibration.sight.AirSetup;
import plumbray.calibration.sight.CameraSetup;
import plumbray.calibration.sight.ProfileSetup;
import plumbray.calibration.sight.Sight;
import plumbray.calibration.sight.StretchSetup;
import plumbray.cli.report.markup.Markup;
import plumbray.cli.report.markup.NumberText;
import plumbray.raymodel.profile.ProfileFamily;

/** What the sight took as known. */
final class GivenSection implements Section {

  private static final double UM_PER_M = 1e6;
  private static final double NM_PER_M = 1e9;

  private final Sight sight;
  private final List<String> estimated;

  /** The given part of a sight, without the quantities that were estimated. */
  GivenSection(Sight sight, List<String> estimated) {
    this.sight = sight;
    this.estimated = List.copyOf(estimated);
  }

  @Override
  public void addTo(Markup page) {
    page.open("section");
    page.leaf("h2", "Taken as known");
    Table table = new Table("Quantity", "Value", "Unit").words(0, 2);
    CameraSetup camera = sight.camera();
    AirSetup air = sight.air();
    addFamilies(table);
    table.row("Picture", camera.widthPx() + " \u00d7 " + camera.heightPx(), "px");
    table.row("Pixel pitch", number(camera.pixelPitchM() * UM_PER_M), "\u00b5m");
    quantities().forEach((name, quantity) -> addQuantity(table, name, quantity));
    table.row("Air known at a height of", number(air.atHeightM()), "m");
    table.row("Carbon dioxide", number(air.co2Ppm()), "ppm");
    table.row("Wavelength", number(air.wavelengthM() * NM_PER_M), "nm");
    if (!air.channelWavelengthsM().isEmpty()) {
      String each =
          air.channelWavelengthsM().stream()
              .map(wavelength -> number(wavelength * NM_PER_M))
              .collect(Collectors.joining(", "));
      table.row("Wavelengths of red, green and blue", each, "nm");
    }
    table.row("Earth's radius", NumberText.significant(sight.path().earthRadiusM() / 1e3, 7), "km");
    table.addTo(page);
    page.close();
  }

  private void addFamilies(Table table) {
    ProfileSetup profile = sight.profile();
    table.row("Family of profiles", family(profile), "");
    for (StretchSetup stretch : profile.further()) {
      table.row("Family of profiles further on", family(stretch.profile()), "");
      table.row("which begins at", number(stretch.fromM()), "m");
      table.row("blending over", number(stretch.blendM()), "m");
    }
  }

  private static String family(ProfileSetup profile) {
    return profile.family().map(ProfileFamily::key).orElse("left to the fit");
  }

  private static String number(double value) {
    return NumberText.significant(value, 6);
  }

  private Map<String, Quantity> quantities() {
    Map<String, Quantity> all = new LinkedHashMap<>();
    all.put("camera.focalLengthM", sight.camera().focalLengthM());
    all.put("camera.heightM", sight.camera().heightM());
    all.put("camera.pitchRad", sight.camera().pitchRad());
    all.put("camera.rollRad", sight.camera().rollRad());
    all.put("path.blockedBelowM", sight.path().blockedBelowM());
    all.put("air.temperatureK", sight.air().temperatureK());
    all.put("air.pressurePa", sight.air().pressurePa());
    all.put("air.relativeHumidity", sight.air().relativeHumidity());
    List<ProfileSetup> stretches = sight.profile().stretches();
    for (int i = 0; i < stretches.size(); i++) {
      String prefix = sight.profile().prefix(i);
      stretches.get(i).quantities().forEach((key, quantity) -> all.put(prefix + key, quantity));
    }
    for (int i = 0; i < sight.references().size(); i++) {
      all.put("references[" + i + "].footM", sight.references().get(i).footM());
    }
    return all;
  }

  private void addQuantity(Table table, String name, Quantity quantity) {
    if (!estimated.contains(name)) {
      QuantityName known = QuantityName.of(name, sight.references());
      String open = quantity.estimated() ? " (open)" : "";
      table.row(known.label() + open, number(known.shown(quantity.value())), known.unit());
    }
  }
}
