package plumbray.commandline;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.nio.file.attribute.PosixFilePermissions;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.jar.JarOutputStream;
import java.util.zip.ZipEntry;
import javax.tools.ToolProvider;

/**
 * The folders around a copy of the start script, a stand-in program, and a folder of tools that
 * holds nothing but what the script may use.
 */
final class StartScriptCheckout {
  private static final List<String> TOOLS =
      List.of(
          "cat",
          "cp",
          "date",
          "dirname",
          "find",
          "head",
          "mkdir",
          "mv",
          "readlink",
          "rm",
          "sed",
          "sleep",
          "tr");

  /** Says what it was given, and ends with its first argument as the status. */
  private static final String STAND_IN_PROGRAM =
      """
      package plumbray.cli;
      public final class Main {
        public static void main(String[] arguments) throws Exception {
          System.out.println(java.util.Arrays.asList(arguments));
          System.out.println(new String(System.in.readAllBytes()).strip());
          System.out.println(System.getProperty("user.dir"));
          System.out.println("headless " + System.getProperty("java.awt.headless"));
          System.err.println("to standard error");
          System.exit(arguments[0].startsWith("-") ? 0 : Integer.parseInt(arguments[0]));
        }
      }
      """;

  private static final String STAND_IN_MAVEN =
      """
      #!/bin/sh
      echo called >>"$FAKE_MAVEN_CALLS"
      sleep "${FAKE_MAVEN_SLEEP:-0}"
      if [ -n "${FAKE_MAVEN_ERROR:-}" ]; then
        echo "[ERROR] $FAKE_MAVEN_ERROR"
        exit 1
      fi
      mkdir -p cli/target/start-script && cp "$FAKE_PROGRAM" cli/target/start-script/cli-1.jar
      """;

  private final Path root;
  private final Path tools;
  private final Path program;
  private final Path calls;
  private final Path elsewhere;

  /** What a finished process left. */
  record Outcome(int status, List<String> out, List<String> err) {}

  private StartScriptCheckout(Path folder) {
    root = folder.resolve("checkout");
    tools = folder.resolve("tools");
    program = folder.resolve("program.jar");
    calls = folder.resolve("calls");
    elsewhere = folder.resolve("elsewhere");
  }

  static StartScriptCheckout in(Path folder) throws IOException {
    Files.createDirectories(folder);
    StartScriptCheckout checkout = new StartScriptCheckout(folder.toRealPath());
    Files.createDirectories(checkout.elsewhere);
    checkout.copyScript();
    checkout.gatherTools();
    checkout.packProgram(folder);
    return checkout;
  }

  Path script() {
    return root.resolve("cli/plumbray");
  }

  Path source() {
    return root.resolve("raymodel/src/main/Source.java");
  }

  Path state() {
    return root.resolve("cli/target/launcher");
  }

  Path maven() {
    return tools.resolve("mvn");
  }

  /** The folder that the script is started from. */
  Path elsewhere() {
    return elsewhere;
  }

  int builds() throws IOException {
    return Files.exists(calls) ? Files.readAllLines(calls).size() : 0;
  }

  Outcome start(String... arguments) throws IOException, InterruptedException {
    return startAs(script(), Map.of(), arguments);
  }

  /** An empty value in {@code environment} removes the variable. */
  Outcome startAs(Path name, Map<String, String> environment, String... arguments)
      throws IOException, InterruptedException {
    Process process = begin(name, environment, arguments);
    int status = process.waitFor();
    return new Outcome(
        status,
        lines(process.getInputStream().readAllBytes()),
        lines(process.getErrorStream().readAllBytes()));
  }

  Process begin(Path name, Map<String, String> environment, String... arguments)
      throws IOException {
    List<String> command = new ArrayList<>(List.of(name.toString()));
    command.addAll(List.of(arguments));
    ProcessBuilder builder = new ProcessBuilder(command).directory(elsewhere.toFile());
    Map<String, String> variables = builder.environment();
    variables.clear();
    variables.put("PATH", tools.toString());
    variables.put("JAVA_HOME", System.getProperty("java.home"));
    variables.put("FAKE_MAVEN_CALLS", calls.toString());
    variables.put("FAKE_PROGRAM", program.toString());
    variables.putAll(environment);
    variables.values().removeIf(String::isEmpty);
    Process process = builder.start();
    try (OutputStream input = process.getOutputStream()) {
      input.write("typed in\n".getBytes(StandardCharsets.UTF_8));
    }
    return process;
  }

  private static List<String> lines(byte[] text) {
    return new String(text, StandardCharsets.UTF_8).lines().toList();
  }

  private void copyScript() throws IOException {
    for (String module : List.of("raymodel", "calibration", "imaging", "cli")) {
      Files.createDirectories(root.resolve(module).resolve("src/main"));
      age(Files.createFile(root.resolve(module).resolve("pom.xml")));
    }
    age(Files.createFile(root.resolve("pom.xml")));
    age(Files.createFile(source()));
    Files.copy(Path.of("..", "cli", "plumbray"), script());
    makeExecutable(script());
  }

  private static void age(Path file) throws IOException {
    Files.setLastModifiedTime(file, FileTime.from(Instant.now().minus(Duration.ofHours(1))));
  }

  private void gatherTools() throws IOException {
    Files.createDirectories(tools);
    for (String tool : TOOLS) {
      Path bin = Path.of("/bin", tool);
      Path real = Files.exists(bin) ? bin : Path.of("/usr/bin", tool);
      writeScript(tools.resolve(tool), "#!/bin/sh\nexec " + real + " \"$@\"\n");
    }
    writeScript(maven(), STAND_IN_MAVEN);
  }

  static void writeScript(Path file, String text) throws IOException {
    Files.writeString(file, text);
    makeExecutable(file);
  }

  private static void makeExecutable(Path file) throws IOException {
    Files.setPosixFilePermissions(file, PosixFilePermissions.fromString("rwxr-xr-x"));
  }

  private void packProgram(Path folder) throws IOException {
    Path java = folder.resolve("Main.java");
    Files.writeString(java, STAND_IN_PROGRAM);
    int compiled =
        ToolProvider.getSystemJavaCompiler()
            .run(null, null, null, "-d", folder.toString(), java.toString());
    if (compiled != 0) {
      throw new IOException("the stand-in program does not compile");
    }
    String entry = "plumbray/cli/Main.class";
    try (JarOutputStream jar = new JarOutputStream(Files.newOutputStream(program))) {
      jar.putNextEntry(new ZipEntry(entry));
      Files.copy(folder.resolve(entry), jar);
      jar.closeEntry();
    }
  }
}
