package org.wispwright.ui.window.notes;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Component;
import java.awt.Dimension;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import javax.swing.JComponent;
import javax.swing.JSpinner;
import javax.swing.JTextField;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.SolvedShot;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.job.PictureWork;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.Takes;
import org.wispwright.ui.window.DeskDriver;
import org.wispwright.ui.window.DeskWindow;
import org.wispwright.ui.window.TestFolders;

/** The notes as a person works with them. Expectations: ours, by the panel's own words. */
class NotesPanelTest {
    @TempDir
    private static Path made;
    private static Path solved;
    @TempDir
    private Path place;

    @BeforeAll
    static void solve() {
        solved = SolvedShot.in(made.resolve("yard"));
    }

    private DeskDriver open(Dimension size, boolean dark, double scale) throws IOException {
        return new DeskDriver(size, dark, scale).open(TestFolders.copy(solved, place.resolve("yard")));
    }

    private static List<String> ids(DeskState s) {
        return s.shot().orElseThrow().notes().stream().map(l -> l.note().id()).toList();
    }

    private static Listed note(DeskDriver d, String id) {
        return d.state().shot().orElseThrow().note(id).orElseThrow();
    }

    private static String met(DeskDriver d, String id) {
        MetBar bar = d.find("met-" + id, MetBar.class);
        return DeskDriver.onSwing(bar::words);
    }

    private static void awaitOpen(DeskDriver d, String id) {
        d.await(id + " is open", s -> s.note().equals(Optional.of(id)));
    }

    private static void awaitWords(DeskDriver d, String id, String words) {
        d.await("the words are " + words, s -> s.shot().orElseThrow().note(id).orElseThrow().note().words().equals(words));
    }

    private static void awaitTyped(DeskDriver d, String text) {
        NoteWords words = d.find("words-lean", NoteWords.class);
        try {
            d.awaitTrue("it is typed: " + text, () -> words.getText().equals(text));
        } catch (AssertionError not) {
            throw new AssertionError("typed is '" + words.getText() + "'", not);
        }
    }

    private static void awaitMessage(DeskDriver d, String part) {
        d.await("it is said: " + part, s -> s.message().map(m -> m.words().contains(part)).orElse(false));
    }

    private static void awaitFigures(DeskDriver d) {
        for (String id : ids(d.state())) {
            NoteCard card = (NoteCard) d.everything().stream().filter(c -> ("note-" + id).equals(c.getName())).findFirst().orElseThrow();
            d.awaitTrue("pictures of " + id, card::hasPictures);
            MetBar bar = (MetBar) d.everything().stream().filter(c -> ("met-" + id).equals(c.getName())).findFirst().orElseThrow();
            d.awaitTrue("met of " + id, () -> bar.words().contains("%"));
        }
    }

    @Test
    void cardsShowPicturesAndHowFarTheShownTakeMeetsThem() throws IOException {
        try (DeskDriver d = open(new Dimension(1440, 900), true, 1)) {
            awaitFigures(d);
            assertTrue(met(d, "lean").matches("met \\d+ % by take 1"), met(d, "lean"));
            d.keepScreenshot("notes-dark");
            d.doOnSwing(() -> d.desk().show(s -> s.withNear(Source.ORIGINAL)));
            d.awaitTrue("the original is judged", () -> met(d, "lean").equals("met 0 % by original"));
        }
    }

    @Test
    void aClickOnACardOpensTheNoteAndGoesThere() throws IOException {
        try (DeskDriver d = open(DeskWindow.SMALLEST, false, 1)) {
            awaitFigures(d);
            d.keepScreenshot("notes-light");
            d.click("pictures-open");
            awaitOpen(d, "open");
            d.await("its place is shown", s -> s.showing().orElseThrow().frame() == 1006 && s.showing().get().view().equals("side"));
            d.find("open-open", Component.class);                              // "open" stands on that card
            assertThrows(AssertionError.class, () -> d.find("open-lean", Component.class));
            d.key("UP");
            JComponent lean = d.find("note-lean", JComponent.class);
            d.awaitTrue("the card above has the focus", lean::isFocusOwner);
            awaitOpen(d, "open");
            d.key("ENTER");
            d.await("its place is shown", s -> s.showing().orElseThrow().frame() == 1004);
            d.key("shift DOWN");
            awaitOpen(d, "open");
        }
    }

    @Test
    void wordsAreEditedInPlace() throws IOException {
        try (DeskDriver d = open(new Dimension(1440, 900), true, 1)) {
            Component words = d.find("words-lean", Component.class);
            d.clickAt(d.onScreen(words, 0.3, 0.3));
            d.clickAt(d.onScreen(words, 0.3, 0.3));
            d.type("N o w");                                                   // neither N nor O nor W is taken as a shortcut
            awaitTyped(d, "N o w");
            d.key("ENTER");
            awaitWords(d, "lean", "N o w");
            assertEquals(2, ids(d.state()).size());
            assertEquals("Change words", d.state().history().undoName().orElseThrow());
            d.key("F2");
            d.type("dropped");
            awaitTyped(d, "dropped");
            d.key("ESCAPE");
            awaitWords(d, "lean", "N o w");
            JComponent card = d.find("note-lean", JComponent.class);
            d.awaitTrue("the card has the focus again", card::isFocusOwner);
            d.key("W");
            d.type("kept by leaving");
            awaitTyped(d, "kept by leaving");
            d.click("weight-open");
            awaitWords(d, "lean", "kept by leaving");
            d.key("ctrl Z");
            d.key("ctrl Z");
            awaitWords(d, "lean", "Lean the head to the left.");
        }
    }

    @Test
    void notesAreMadeDuplicatedTurnedOffWeighedAndDeletedAndAllOfItUndone() throws IOException {
        try (DeskDriver d = open(new Dimension(1440, 900), true, 1)) {
            List<Listed> before = d.state().shot().orElseThrow().notes();
            d.doOnSwing(() -> d.desk().show(s -> s.withFrame(1001)));
            d.click("note-new");
            awaitMessage(d, "no force can change");
            d.doOnSwing(() -> d.desk().show(s -> s.withFrame(1002)));
            d.click("note-new");
            awaitOpen(d, "note-1");
            awaitWords(d, "note-1", "New note");
            d.awaitTrue("it wants nothing yet", () -> met(d, "note-1").equals("changes nothing yet"));
            d.key("ctrl D");
            awaitOpen(d, "note-1-1");
            d.doOnSwing(() -> d.desk().look(st -> st.withNote(Optional.of("lean"))));
            d.click("on-lean");
            d.await("lean is off", st -> !st.shot().orElseThrow().note("lean").orElseThrow().on());
            JSpinner weight = d.find("weight-lean", JSpinner.class);
            d.clickAt(d.onScreen(weight, 0.93, 0.25));
            d.await("it weighs more", st -> Math.abs(st.shot().orElseThrow().note("lean").orElseThrow().note().weight() - 1.1) < 1e-9);
            d.click("more-lean");
            d.click("menu-note.delete");
            d.await("it is gone", st -> !ids(st).contains("lean"));
            d.await("another is open", st -> st.note().isPresent());
            for (int n = 0; n < 5; n++) {
                d.key("ctrl Z");
            }
            d.await("all is as before", st -> st.shot().orElseThrow().notes().equals(before));
            d.await("on disk", s -> s.saving().isDone());
        }
    }

    @Test
    void aNoteIsCarriedAndOthersAreMadeBetween() throws IOException {
        try (DeskDriver d = open(DeskWindow.SMALLEST, true, 1)) {
            d.act("note.carry");
            d.type("1002");
            d.keepScreenshot("notes-carry");
            d.click("carry-done");
            d.await("carried", s -> ids(s).contains("lean-1002"));
            assertThrows(AssertionError.class, () -> d.find("carry", Component.class));
            d.act("note.between");
            d.keepScreenshot("notes-between");
            d.click("between-done");
            d.await("made between", s -> ids(s).contains("lean-1002-1003"));
            d.act("note.carry");
            d.type("1006");
            d.click("carry-follow");
            d.click("carry-done");
            d.await("carried along", s -> ids(s).contains("lean-1006"));
            d.act("note.carry");
            d.type("1001");
            d.key("ENTER");
            awaitMessage(d, "found frame 1001");
            d.key("ESCAPE");
            d.find("note-new", Component.class);
        }
    }

    @Test
    void aPaintOverBecomesANoteAndUndoTakesItBack() throws IOException {
        try (DeskDriver d = open(new Dimension(1440, 900), true, 1)) {
            Path shot = place.resolve("yard");
            paint(shot, place.resolve("before.png"), place.resolve("after.png"));
            d.doOnSwing(() -> d.desk().show(s -> s.withView("front").withFrame(1005)));
            d.act("note.paint-over");
            d.doOnSwing(() -> {
                d.find("paint-before", JTextField.class).setText(place.resolve("before.png").toString());
                d.find("paint-after", JTextField.class).setText(place.resolve("nothing.png").toString());
            });
            d.keepScreenshot("notes-paint-over");
            d.click("paint-done");
            d.await("it is said", s -> s.message().map(m -> m.words().contains("nothing.png")).orElse(false));
            d.doOnSwing(() -> d.find("paint-after", JTextField.class).setText(place.resolve("after.png").toString()));
            d.click("paint-done");
            d.await("the note is there and open", s -> s.note().equals(Optional.of("painted-1")));
            assertTrue(Files.exists(shot.resolve("notes/painted-1.json")));
            Note note = note(d, "painted-1").note();
            assertEquals("As painted", note.words());
            d.await("undo knows it", s -> s.history().undoName().isPresent());
            d.key("ctrl Z");
            d.await("it is gone", s -> !ids(s).contains("painted-1"));
        }
    }

    /** A frame over the shot's background, and the same with its left half painted over. */
    private static void paint(Path folder, Path before, Path after) throws IOException {
        Shot shot = ShotCheck.require(folder, 1L << 30);
        try (Lanes lanes = new Lanes(1)) {
            Picture picture = PictureWork.over(PictureWork.picture(shot, Takes.of(ShotFolder.open(folder)).density(0, 1005, shot.flow()),
                    shot.view("front").orElseThrow().view(), lanes), shot.background());
            PngFile.write(picture, before, PngFile.Depth.EIGHT);
            for (int p = 0; p < picture.width() * picture.height(); p++) {
                if (p % picture.width() < picture.width() / 2) {
                    System.arraycopy(new float[] {0.1f, 0.14f, 0.2f, 1}, 0, picture.rgba(), 4 * p, 4);
                }
            }
            PngFile.write(picture, after, PngFile.Depth.EIGHT);
        }
    }

    @Test
    void withoutNotesOneSentenceAndOneButton() throws IOException {
        Path shot = TestFolders.copy(solved, place.resolve("bare"));
        Files.delete(shot.resolve("notes/lean.json"));
        Files.delete(shot.resolve("notes/open.json"));
        try (DeskDriver d = new DeskDriver(DeskWindow.SMALLEST, false, 2).open(shot)) {
            d.find("notes-empty", Component.class);
            d.keepScreenshot("notes-empty-200");
            d.click("note-new");
            d.find("note-note-1", Component.class);
            d.keepScreenshot("notes-one-200");
        }
    }

    /** WCAG 2.x, 4.1.2: every control has a name. */
    @Test
    void everyControlIsNamedAndExplained() throws IOException {
        try (DeskDriver d = open(new Dimension(1440, 900), true, 1)) {
            for (String id : List.of("lean", "open")) {
                for (String part : List.of("note", "words", "pictures", "on", "weight", "weight-text", "more", "met")) {
                    JComponent c = d.find(part + "-" + id, JComponent.class);
                    assertFalse(String.valueOf(c.getAccessibleContext().getAccessibleName()).isBlank(), part);
                }
            }
        }
    }
}
