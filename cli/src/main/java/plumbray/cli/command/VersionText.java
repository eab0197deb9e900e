package plumbray.cli.command;

import picocli.CommandLine.IVersionProvider;
import plumbray.cli.document.ProgramVersion;

/** The text of {@code --version}: the program's version and the Java that runs it. */
final class VersionText implements IVersionProvider {
  @Override
  public String[] getVersion() {
    return new String[] {
      "plumbray " + ProgramVersion.name(),
      "Java " + System.getProperty("java.version") + " (" + System.getProperty("java.vendor") + ")"
    };
  }
}
