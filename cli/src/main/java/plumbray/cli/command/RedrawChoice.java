package plumbray.cli.command;

import java.util.Locale;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import plumbray.imaging.rectify.Interpolation;
import plumbray.imaging.rectify.RedrawOptions;

/** How photos are redrawn: options of every command that does. */
final class RedrawChoice {
  @Spec(Spec.Target.MIXEE)
  private CommandSpec spec;

  @Option(
      names = "--interpolation",
      paramLabel = "KIND",
      defaultValue = "cubic",
      description =
          "How the photo is read between its pixels: cubic (default) or lanczos, sharper.")
  private String interpolation;

  @Option(
      names = "--linear-light",
      description = "Mix pixels by their light, not by their encoded values.")
  private boolean linearLight;

  @Option(
      names = "--both-images",
      description =
          "Draw what is seen upright and upside down from both images: less noise, and a little less"
              + " sharp where shimmer blurs one.")
  private boolean bothImages;

  RedrawOptions options() {
    for (Interpolation each : Interpolation.values()) {
      if (each.name().toLowerCase(Locale.ROOT).equals(interpolation)) {
        return new RedrawOptions(each, linearLight, bothImages);
      }
    }
    throw new ParameterException(
        spec.commandLine(),
        "--interpolation is %s, must be cubic or lanczos (reading between pixels)"
            .formatted(interpolation));
  }
}
