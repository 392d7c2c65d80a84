package org.wispwright.ui;

import static com.tngtech.archunit.base.DescribedPredicate.not;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.conditions.ArchConditions.callMethod;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.conditions.ArchConditions;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

/** The walls between the rooms, as the package-info files state them. */
class WallsTest {
    private static final JavaClasses OURS = new ClassFileImporter().withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
            .withImportOption(location -> !location.contains("-tests.jar"))
            .importPackages("org.wispwright");

    /** A wall test that sees nothing holds nothing. */
    @Test
    void allFourRoomsAreSeen() {
        Set<String> rooms = new TreeSet<>();
        for (JavaClass c : OURS) {
            rooms.add(c.getPackageName().split("\\.")[2]);
        }
        assertEquals(Set.of("render", "warp", "optimize", "ui"), rooms);
    }

    @Test
    void renderUsesNoOtherRoom() {
        noClasses().that().resideInAPackage("org.wispwright.render..").should().dependOnClassesThat()
                .resideInAnyPackage("org.wispwright.warp..", "org.wispwright.optimize..", "org.wispwright.ui..").check(OURS);
    }

    @Test
    void warpUsesRenderAlone() {
        noClasses().that().resideInAPackage("org.wispwright.warp..").should().dependOnClassesThat()
                .resideInAnyPackage("org.wispwright.optimize..", "org.wispwright.ui..").check(OURS);
    }

    @Test
    void optimizeUsesOfWarpOnlyItsLosses() {
        noClasses().that().resideInAPackage("org.wispwright.optimize..").should().dependOnClassesThat(
                resideInAnyPackage("org.wispwright.warp..").and(not(resideInAnyPackage("org.wispwright.warp.loss..")))).check(OURS);
    }

    @Test
    void nothingUsesUi() {
        noClasses().that().resideOutsideOfPackage("org.wispwright.ui..").should().dependOnClassesThat()
                .resideInAnyPackage("org.wispwright.ui..").because("a solve must run without a screen").check(OURS);
    }

    @Test
    void onlyUiKnowsSwing() {
        noClasses().that().resideOutsideOfPackage("org.wispwright.ui..").should().dependOnClassesThat()
                .resideInAnyPackage("javax.swing..").check(OURS);
    }

    @Test
    void inUiTheJobsAndTheShotKnowNoScreen() {
        noClasses().that().resideInAnyPackage("org.wispwright.ui.shot..", "org.wispwright.ui.job..", "org.wispwright.ui.command..",
                "org.wispwright.ui.desk..").should().dependOnClassesThat()
                .resideInAnyPackage("javax.swing..").check(OURS);
        noClasses().that().resideInAnyPackage("org.wispwright.ui.shot..", "org.wispwright.ui.desk..").should().dependOnClassesThat()
                .resideInAnyPackage("java.awt..").check(OURS);
    }

    @Test
    void onlyTheCommandOpensTheWindow() {
        noClasses().that().resideInAPackage("org.wispwright.ui..").and()
                .resideOutsideOfPackages("org.wispwright.ui.window..", "org.wispwright.ui.command..").should().dependOnClassesThat()
                .resideInAPackage("org.wispwright.ui.window..").check(OURS);
        noClasses().that().resideInAnyPackage("org.wispwright.ui.shot..", "org.wispwright.ui.job..", "org.wispwright.ui.report..").should()
                .dependOnClassesThat().resideInAPackage("org.wispwright.ui.desk..").check(OURS);
        noClasses().that().resideOutsideOfPackage("org.wispwright.ui.window..").should().dependOnClassesThat()
                .resideInAnyPackage("com.formdev..", "net.miginfocom..", "javax.swing..").check(OURS);
    }

    @Test
    void outsideUiJavaAwtIsBufferedImagesAtTheDoorsOfPictures() {
        noClasses().that().resideOutsideOfPackages("org.wispwright.ui..", "org.wispwright.render.picture..", "org.wispwright.warp..")
                .should().dependOnClassesThat().resideInAnyPackage("java.awt..").check(OURS);
        noClasses().that().resideInAnyPackage("org.wispwright.render..", "org.wispwright.warp..").should().dependOnClassesThat(
                resideInAnyPackage("java.awt..").and(not(resideInAnyPackage("java.awt.image..", "java.awt.color..")))).check(OURS);
        noClasses().that().haveSimpleNameEndingWith("Kernel").should().dependOnClassesThat().resideInAnyPackage("java.awt..").check(OURS);
    }

    @Test
    void theCommandLineIsAShell() {
        noClasses().that().resideInAPackage("org.wispwright.ui..").and().resideOutsideOfPackage("org.wispwright.ui.command..")
                .should().dependOnClassesThat().resideInAnyPackage("org.wispwright.ui.command..", "picocli..").check(OURS);
        noClasses().that().resideInAPackage("org.wispwright.ui.shot..").should().dependOnClassesThat()
                .resideInAnyPackage("org.wispwright.ui.job..", "org.wispwright.ui.report..").check(OURS);
    }

    @Test
    void jsonStaysInUi() {
        noClasses().that().resideOutsideOfPackage("org.wispwright.ui..").should().dependOnClassesThat()
                .resideInAnyPackage("com.fasterxml..", "picocli..", "org.imgscalr..").check(OURS);
    }

    @Test
    void packagesGoByTheirSubject() {
        noClasses().should().resideInAnyPackage("..util..", "..utils..", "..common..", "..misc..", "..impl..", "..manager..").check(OURS);
    }

    @Test
    void noPackagesGoRound() {
        slices().matching("org.wispwright.(*).(*)..").should().beFreeOfCycles().check(OURS);
    }

    @Test
    void everyPackageSaysWhatItIsFor() {
        Set<String> packages = OURS.stream().map(JavaClass::getPackageName).collect(Collectors.toCollection(TreeSet::new));
        // A package-info without annotations leaves no class file, so the sources are asked.
        for (String name : packages) {
            String room = name.split("\\.")[2];
            Path source = Path.of("..", room, "src", "main", "java").resolve(name.replace('.', '/')).resolve("package-info.java");
            assertTrue(Files.isRegularFile(source), () -> name + " has no package-info.java");
        }
    }

    @Test
    void onlyMainEndsTheProcess() {
        classes().that().resideInAPackage("org.wispwright..").and().doNotHaveFullyQualifiedName("org.wispwright.ui.command.Main")
                .should(ArchConditions.not(callMethod(System.class, "exit", int.class))).check(OURS);
    }
}
