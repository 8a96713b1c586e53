package fringekeep.architecture;

import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.library.GeneralCodingRules;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/** The table of the house: who may depend on whom, where Swing, SQL and the platform may stand, and no circles. */
class HouseTest {
    private static final List<String> STAGES =
            List.of("sample", "instrument", "sourcerun", "scan", "fit", "property", "figure");

    private static final JavaClasses ALL = new ClassFileImporter()
            .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
            .importPackages("fringekeep");

    private static Map<String, List<String>> mayUse() {
        Map<String, List<String>> table = new LinkedHashMap<>();
        table.put("interferometry", List.of());
        table.put("drawing", List.of());
        table.put("archive", List.of("drawing"));
        table.put("desk", List.of("archive", "drawing"));
        for (int i = 0; i < STAGES.size(); i++) {
            List<String> before = new ArrayList<>(List.of("archive", "drawing", "interferometry"));
            before.addAll(STAGES.subList(0, i));
            table.put(STAGES.get(i), before);
        }
        table.put("audit", List.of("archive", "drawing", "interferometry"));
        table.put("bundle", List.of("archive", "drawing"));
        List<String> below = new ArrayList<>(List.of("archive", "drawing", "interferometry", "audit", "bundle"));
        below.addAll(STAGES);
        table.put("daysheet", below);
        List<String> forCommands = new ArrayList<>(below);
        forCommands.add("daysheet");
        table.put("commandline", forCommands);
        return table;
    }

    @TestFactory
    Stream<DynamicTest> aModuleUsesOnlyWhatStandsBeforeIt() {
        return mayUse().entrySet().stream()
                .map(entry -> DynamicTest.dynamicTest(entry.getKey(), () -> {
                    List<String> forbidden = mayUse().keySet().stream()
                            .filter(other -> !other.equals(entry.getKey()))
                            .filter(other -> !entry.getValue().contains(other))
                            .map(other -> "fringekeep." + other + "..")
                            .toList();
                    noClasses()
                            .that()
                            .resideInAPackage("fringekeep." + entry.getKey() + "..")
                            .and()
                            .resideOutsideOfPackage("fringekeep." + entry.getKey() + ".ui..")
                            .should()
                            .dependOnClassesThat(resideInAnyPackage(forbidden.toArray(String[]::new)))
                            .check(ALL);
                }));
    }

    /** Windows of a stage see what the stage itself may see, the stage, and the desk; the headless program sees no windows. */
    @TestFactory
    Stream<DynamicTest> windowsOfAStageUseOnlyItAndWhatStandsBeforeIt() {
        return mayUse().entrySet().stream()
                .filter(entry -> !entry.getKey().equals("desk"))
                .map(entry -> DynamicTest.dynamicTest(entry.getKey() + " windows", () -> {
                    List<String> forbidden = mayUse().keySet().stream()
                            .filter(other -> !other.equals(entry.getKey()) && !other.equals("desk"))
                            .filter(other -> !entry.getValue().contains(other))
                            .map(other -> "fringekeep." + other + "..")
                            .toList();
                    noClasses()
                            .that()
                            .resideInAPackage("fringekeep." + entry.getKey() + ".ui..")
                            .should()
                            .dependOnClassesThat(resideInAnyPackage(forbidden.toArray(String[]::new)))
                            .allowEmptyShould(true)
                            .check(ALL);
                }));
    }

    @Test
    void noCoreKnowsWindows() {
        noClasses()
                .that()
                .resideOutsideOfPackages("fringekeep.desk..", "fringekeep..ui..")
                .should()
                .dependOnClassesThat()
                .resideInAnyPackage("fringekeep.desk..", "fringekeep..ui..")
                .check(ALL);
    }

    @Test
    void packagesFormNoCircles() {
        slices().matching("fringekeep.(**)").should().beFreeOfCycles().check(ALL);
    }

    @Test
    void onlyTheArchiveSpeaksSql() {
        noClasses()
                .that()
                .resideOutsideOfPackage("fringekeep.archive..")
                .should()
                .dependOnClassesThat()
                .resideInAnyPackage("java.sql..", "javax.sql..", "org.apache.derby..")
                .check(ALL);
    }

    @Test
    void swingAndThePlatformStayInWindows() {
        noClasses()
                .that()
                .resideOutsideOfPackages("fringekeep.desk..", "fringekeep..ui..", "fringekeep.drawing..")
                .should()
                .dependOnClassesThat()
                .resideInAnyPackage("javax.swing..", "java.awt.event..", "org.openide..", "org.netbeans..")
                .check(ALL);
    }

    @Test
    void theNumbersTouchNoFilesAndNoWindows() {
        noClasses()
                .that()
                .resideInAPackage("fringekeep.interferometry..")
                .should()
                .dependOnClassesThat()
                .resideInAnyPackage("java.io..", "java.nio.file..", "java.awt..", "javax.swing..", "java.net..")
                .check(ALL);
    }

    @Test
    void nobodyPrintsButTheHeadlessProgram() {
        noClasses()
                .that()
                .resideOutsideOfPackage("fringekeep.commandline..")
                .should(GeneralCodingRules.ACCESS_STANDARD_STREAMS)
                .check(ALL);
    }

    @Test
    void resultsDoNotHangOnThePlatformsMathematics() {
        DescribedPredicate<JavaClass> onAPath = resideInAnyPackage("fringekeep.interferometry..");
        noClasses()
                .that(onAPath)
                .should(NotBitStable.CALLS)
                .because("Math.sin and its like may differ in the last bit between machines; StrictMath does not")
                .check(ALL);
    }

    @Test
    void everyModuleIsSeen() {
        for (String module : mayUse().keySet()) {
            assertThat(ALL.stream().filter(type -> type.getPackageName().startsWith("fringekeep." + module)))
                    .as("classes of module %s", module)
                    .isNotEmpty();
        }
        assertThat(ALL.size()).as("classes seen").isGreaterThan(400);
        classes().should().haveSimpleNameNotEndingWith("Impl").check(ALL);
    }
}
