package plumbray.cli.report;

import java.util.List;
import plumbray.cli.report.markup.Markup;

/** What everyone who acts on a page must know; on every page. */
final class Cautions implements Section {

  private static final List<String> TEXTS =
      List.of(
          "A fitted air holds for the minutes around its photo. Clouds, wind and traffic change it;"
              + " fit each photo by itself.",
          "Shimmer is another error than the mean bending corrected here. It blurs and shakes"
              + " details; only averaging over many photos makes it smaller.",
          "The readings do not replace a survey by a licensed surveyor, nor the codes and"
              + " tolerances that hold where you are. Do not decide by them alone whether something"
              + " is safe.",
          "Roads, runways, railways and hot plant are dangerous places to stand and to look at"
              + " through a viewfinder. Work with permission, from where you are allowed to be,"
              + " with a lookout.",
          "Never aim a long lens at the sun, nor at its reflection: it blinds.");

  @Override
  public void addTo(Markup page) {
    page.open("section", "class", "cautions");
    page.leaf("h2", "Before you use this");
    page.open("ul");
    TEXTS.forEach(text -> page.leaf("li", text));
    page.close().close();
  }
}
