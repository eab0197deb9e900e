package plumbray.architecture;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.codeUnits;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.fields;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaCodeUnit;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.junit.AnalyzeClasses;
import com.tngtech.archunit.junit.ArchTest;
import com.tngtech.archunit.lang.ArchCondition;
import com.tngtech.archunit.lang.ArchRule;
import com.tngtech.archunit.lang.ConditionEvents;
import com.tngtech.archunit.lang.SimpleConditionEvent;
import java.util.stream.Stream;

/** What no class may do, wherever it is. */
@AnalyzeClasses(packages = "plumbray", importOptions = ImportOption.DoNotIncludeTests.class)
class MannersTest {
  @ArchTest
  static final ArchRule ONLY_THE_PROGRAM_PRINTS =
      noClasses()
          .that()
          .resideOutsideOfPackage("plumbray.cli")
          .should()
          .accessField(System.class, "out")
          .orShould()
          .accessField(System.class, "err")
          .orShould()
          .callMethod(Throwable.class, "printStackTrace");

  @ArchTest
  static final ArchRule ONLY_THE_PROGRAM_EXITS =
      noClasses()
          .that()
          .resideOutsideOfPackage("plumbray.cli")
          .should()
          .callMethod(System.class, "exit", int.class)
          .orShould()
          .callMethod(Runtime.class, "exit", int.class)
          .orShould()
          .callMethod(Runtime.class, "halt", int.class);

  @ArchTest
  static final ArchRule COMPUTING_READS_NO_CLOCK_AND_NO_ENVIRONMENT =
      noClasses()
          .that()
          .resideOutsideOfPackage("plumbray.cli..")
          .should()
          .callMethod(System.class, "currentTimeMillis")
          .orShould()
          .callMethod(System.class, "nanoTime")
          .orShould()
          .callMethod(System.class, "getenv", String.class)
          .orShould()
          .callMethod(Math.class, "random");

  @ArchTest
  static final ArchRule NOTHING_STATIC_CHANGES = fields().that().areStatic().should().beFinal();

  @ArchTest
  static final ArchRule PUBLIC_SIGNATURES_SHOW_NO_LIBRARY =
      codeUnits()
          .that()
          .arePublic()
          .and()
          .areDeclaredInClassesThat()
          .resideOutsideOfPackage("plumbray.cli..")
          .should(showOnlyTypesOfJavaAndOurs());

  private static ArchCondition<JavaCodeUnit> showOnlyTypesOfJavaAndOurs() {
    return new ArchCondition<>("show only types of Java and our own") {
      @Override
      public void check(JavaCodeUnit unit, ConditionEvents events) {
        Stream.of(
                unit.getReturnType().getAllInvolvedRawTypes().stream(),
                unit.getParameterTypes().stream().flatMap(t -> t.getAllInvolvedRawTypes().stream()),
                unit.getExceptionTypes().stream())
            .flatMap(types -> types)
            .filter(type -> !isOursOrJavas(type))
            .forEach(
                type ->
                    events.add(
                        SimpleConditionEvent.violated(
                            unit, unit.getFullName() + " shows " + type.getName())));
      }
    };
  }

  private static boolean isOursOrJavas(JavaClass type) {
    JavaClass base = type.getBaseComponentType();
    return base.isPrimitive()
        || base.getPackageName().startsWith("java.")
        || base.getPackageName().startsWith("javax.")
        || base.getPackageName().startsWith("plumbray.");
  }
}
