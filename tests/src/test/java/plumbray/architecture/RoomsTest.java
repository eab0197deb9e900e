package plumbray.architecture;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.Architectures.layeredArchitecture;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;

import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.junit.AnalyzeClasses;
import com.tngtech.archunit.junit.ArchTest;
import com.tngtech.archunit.lang.ArchRule;

/** Arrows go one way, and each library stays in the room that needs it. */
@AnalyzeClasses(packages = "plumbray", importOptions = ImportOption.DoNotIncludeTests.class)
class RoomsTest {
  @ArchTest
  static final ArchRule ROOMS_DEPEND_ONE_WAY =
      layeredArchitecture()
          .consideringOnlyDependenciesInAnyPackage("plumbray..")
          .withOptionalLayers(true)
          .layer("raymodel")
          .definedBy("plumbray.raymodel..")
          .layer("calibration")
          .definedBy("plumbray.calibration..")
          .layer("imaging")
          .definedBy("plumbray.imaging..")
          .layer("cli")
          .definedBy("plumbray.cli..")
          .whereLayer("raymodel")
          .mayNotAccessAnyLayer()
          .whereLayer("calibration")
          .mayOnlyAccessLayers("raymodel")
          .whereLayer("imaging")
          .mayOnlyAccessLayers("raymodel", "calibration")
          .whereLayer("cli")
          .mayNotBeAccessedByAnyLayer();

  @ArchTest
  static final ArchRule EVERY_CLASS_IS_IN_A_ROOM =
      classes()
          .should()
          .resideInAnyPackage(
              "plumbray.raymodel..",
              "plumbray.calibration..",
              "plumbray.imaging..",
              "plumbray.cli..");

  @ArchTest
  static final ArchRule PACKAGES_FORM_NO_CYCLES =
      slices().matching("plumbray.(**)").should().beFreeOfCycles();

  @ArchTest
  static final ArchRule JSON_STAYS_WITH_THE_DOCUMENTS =
      noClasses()
          .that()
          .resideOutsideOfPackage("plumbray.cli.document..")
          .should()
          .dependOnClassesThat()
          .resideInAnyPackage("com.fasterxml.jackson..", "com.networknt..");

  @ArchTest
  static final ArchRule THE_COMMAND_LINE_LIBRARY_STAYS_WITH_THE_COMMANDS =
      noClasses()
          .that()
          .resideOutsideOfPackages("plumbray.cli", "plumbray.cli.command..")
          .should()
          .dependOnClassesThat()
          .resideInAPackage("picocli..");

  @ArchTest
  static final ArchRule THE_PDF_LIBRARY_STAYS_WITH_THE_DRAWN_SHEETS =
      noClasses()
          .that()
          .resideOutsideOfPackage("plumbray.cli.sheet..")
          .should()
          .dependOnClassesThat()
          .resideInAPackage("org.apache.pdfbox..");

  @ArchTest
  static final ArchRule THE_VISION_LIBRARY_STAYS_IN_IMAGING =
      noClasses()
          .that()
          .resideOutsideOfPackage("plumbray.imaging..")
          .should()
          .dependOnClassesThat()
          .resideInAnyPackage("boofcv..", "georegression..", "org.ddogleg..", "org.ejml..");

  @ArchTest
  static final ArchRule THE_METADATA_LIBRARY_STAYS_WITH_THE_METADATA =
      noClasses()
          .that()
          .resideOutsideOfPackage("plumbray.imaging.metadata..")
          .should()
          .dependOnClassesThat()
          .resideInAPackage("org.apache.commons.imaging..");

  @ArchTest
  static final ArchRule THE_MATHEMATICS_LIBRARY_STAYS_IN_CALIBRATION_AND_FITTING =
      noClasses()
          .that()
          .resideOutsideOfPackages(
              "plumbray.calibration..", "plumbray.imaging.fit..", "plumbray.imaging.reading..")
          .should()
          .dependOnClassesThat()
          .resideInAPackage("org.apache.commons.math3..");

  @ArchTest
  static final ArchRule PHYSICS_KNOWS_NO_FILES_IMAGES_OR_CLOCK =
      noClasses()
          .that()
          .resideInAnyPackage("plumbray.raymodel..", "plumbray.calibration..")
          .should()
          .dependOnClassesThat()
          .resideInAnyPackage("java.nio.file..", "java.awt..", "javax.imageio..", "java.time..");
}
