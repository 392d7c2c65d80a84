package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * A shot with one fault gets one sentence and exit code 3 from every command that takes a shot, and nothing on disk
 * changes.
 */
class FaultsTest {
    @TempDir
    private Path place;
    private SmallShot shot;

    @BeforeEach
    void aGoodShot() {
        shot = SmallShot.in(place.resolve("yard"));
    }

    @Test
    void theShotItselfIsInOrder() {
        Run run = Run.of("check", shot.folder().toString());
        assertEquals(0, run.code(), run.err());
        assertTrue(run.out().contains("in order"), run.out());
    }

    @Test
    void missingShotFile() {
        shot.delete("shot.json");
        refused("shot.json", "no such file");
    }

    @Test
    void missingFolder() {
        Run run = Run.of("check", place.resolve("nowhere").toString());
        assertEquals(3, run.code());
        assertOneSentence(run.err(), "nowhere", "found nothing");
    }

    @Test
    void missingRenderedFrame() {
        shot.delete("frames/front.1004.png");
        refused("shot.json at /views/0/rendered/1004", "frames/front.1004.png", "no such file");
    }

    @Test
    void jsonCutShort() {
        shot.write("shot.json", SmallShot.SETUP.substring(0, SmallShot.SETUP.length() / 2));
        refused("shot.json at /look", "cut short");
    }

    @Test
    void noteCutShort() {
        shot.write("notes/lean.json", SmallShot.LEAN.substring(0, SmallShot.LEAN.length() / 2));
        refused("notes/lean.json at /retouch/0", "cut short");
    }

    @Test
    void emptyFile() {
        shot.write("shot.json", "");
        refused("shot.json", "empty file");
    }

    @Test
    void unknownKey() {
        shot.swap("shot.json", "\"buoyancy\"", "\"bouyancy\"");
        refused("shot.json at /flow/bouyancy", "unknown key 'bouyancy'", "did you mean 'buoyancy'");
    }

    @Test
    void unknownKeyInANote() {
        shot.swap("notes/lean.json", "\"weight\"", "\"wieght\"");
        refused("notes/lean.json at /wieght", "unknown key 'wieght'", "did you mean 'weight'");
    }

    @Test
    void unknownLoss() {
        shot.swap("notes/lean.json", "\"weight\"", "\"loss\": [\"pyramid\", \"outline\"], \"weight\"");
        refused("notes/lean.json at /loss/1", "\"outline\"", "\"pyramid\" or \"edges\" or \"transport\" or \"silhouette\"");
    }

    @Test
    void lossNamedTwice() {
        shot.swap("notes/lean.json", "\"weight\"", "\"loss\": [\"edges\", \"edges\"], \"weight\"");
        refused("notes/lean.json at /loss", "none twice");
    }

    @Test
    void noLoss() {
        shot.swap("notes/lean.json", "\"weight\"", "\"loss\": [], \"weight\"");
        refused("notes/lean.json at /loss", "1 to 4");
    }

    @Test
    void lossThatIsNoList() {
        shot.swap("notes/lean.json", "\"weight\"", "\"loss\": \"pyramid\", \"weight\"");
        refused("notes/lean.json at /loss", "list");
    }

    @Test
    void newerVersion() {
        shot.swap("shot.json", "\"wispwright\": 1", "\"wispwright\": 2, \"clouds\": []");
        refused("shot.json at /wispwright", "format 2", "newer");
    }

    @Test
    void newerNote() {
        shot.swap("notes/open.json", "\"wispwright\": 1", "\"wispwright\": 7");
        refused("notes/open.json at /wispwright", "format 7", "newer");
    }

    @Test
    void negativeCellCount() {
        shot.swap("shot.json", "[8, 16, 8]", "[8, -16, 8]");
        refused("shot.json at /grid/cells/1", "found -16", "whole number");
    }

    @Test
    void negativeRadius() {
        shot.swap("shot.json", "\"radiusMetres\": 0.5", "\"radiusMetres\": -0.5");
        refused("shot.json at /sources/0/radiusMetres", "found -0.5", "above 0");
    }

    @Test
    void bareNaN() {
        shot.swap("shot.json", "\"buoyancy\": 3.0", "\"buoyancy\": NaN");
        refused("shot.json at /flow/buoyancy", "NaN");
    }

    @Test
    void quotedNaN() {
        shot.swap("shot.json", "\"cellMetres\": 0.25", "\"cellMetres\": \"NaN\"");
        refused("shot.json at /grid/cellMetres", "\"NaN\"", "without quotes");
    }

    @Test
    void infinity() {
        shot.swap("notes/open.json", "\"strength\": 0.9", "\"strength\": 1e999");
        refused("notes/open.json at /retouch/0/stroke/strength", "infinity");
    }

    @Test
    void pressureThatDoesNotFitTheLine() {
        shot.swap("notes/open.json", "\"strength\": 0.9", "\"pressure\": [0.5, 0.7, 1]");
        refused("notes/open.json at /retouch/0/stroke/pressure", "3 numbers for 2 points", "one for each point");
    }

    @Test
    void pressureBeyondFull() {
        shot.swap("notes/open.json", "\"strength\": 0.9", "\"pressure\": [0.5, 1.5]");
        refused("notes/open.json at /retouch/0/stroke/pressure/1", "1.5", "0 to 1");
    }

    @Test
    void pressureOnNothingKnown() {
        shot.swap("notes/open.json", "\"strength\": 0.9", "\"pressure\": [0.5, 1], \"pressureOn\": \"colour\"");
        refused("notes/open.json at /retouch/0/stroke/pressureOn", "\"colour\"", "\"strength\"");
    }

    @Test
    void pressureOnWithoutPressure() {
        shot.swap("notes/open.json", "\"strength\": 0.9", "\"pressureOn\": \"radius\"");
        refused("notes/open.json at /retouch/0/stroke", "'pressureOn' without 'pressure'", "both or neither");
    }

    @Test
    void spacingTooClose() {
        shot.swap("notes/open.json", "\"strength\": 0.9", "\"spacing\": 0.01");
        refused("notes/open.json at /retouch/0/stroke", "spacing 0.01", "0.05 to 20");
    }

    @Test
    void spacingBelowNothing() {
        shot.swap("notes/open.json", "\"strength\": 0.9", "\"spacing\": -1");
        refused("notes/open.json at /retouch/0/stroke/spacing", "-1", "0 to 20");
    }

    @Test
    void numberWrittenAsText() {
        shot.swap("shot.json", "\"perSecond\": 24", "\"perSecond\": \"24\"");
        refused("shot.json at /frames/perSecond", "the text \"24\"", "without quotes");
    }

    @Test
    void nullForANumber() {
        shot.swap("shot.json", "\"perSecond\": 24", "\"perSecond\": null");
        refused("shot.json at /frames/perSecond", "null");
    }

    @Test
    void missingKey() {
        shot.swap("shot.json", "\"name\": \"Small yard\",", "");
        refused("shot.json", "no 'name'");
    }

    @Test
    void duplicateKey() {
        shot.swap("shot.json", "\"cellMetres\": 0.25", "\"cellMetres\": 0.25, \"cellMetres\": 0.5");
        refused("shot.json at /grid", "'cellMetres' twice");
    }

    @Test
    void textAfterTheEnd() {
        shot.write("shot.json", SmallShot.SETUP + "{}");
        refused("shot.json", "after the last bracket");
    }

    @Test
    void bytesThatAreNotText() {
        shot.write("shot.json", new byte[] {'{', '"', (byte) 0xff, '"', ':', '1', '}'});
        refused("shot.json", "not UTF-8");
    }

    @Test
    void tooDeep() {
        shot.write("notes/lean.json", "[".repeat(500));
        refused("notes/lean.json", "too deep");
    }

    @Test
    void noteFrameOutsideTheFrames() {
        shot.swap("notes/lean.json", "\"frame\": 1004", "\"frame\": 1040");
        refused("notes/lean.json at /frame", "frame 1040", "1001 to 1006");
    }

    @Test
    void holdOutsideTheFrames() {
        shot.swap("notes/open.json", "[1003, 1006]", "[1003, 1060]");
        refused("notes/open.json at /holds/0/frames", "1003 to 1060");
    }

    @Test
    void noteOnAnUnknownView() {
        shot.swap("notes/lean.json", "\"view\": \"front\"", "\"view\": \"frnt\"");
        refused("notes/lean.json at /view", "'frnt'", "did you mean 'front'");
    }

    @Test
    void pictureOfAnotherAspect() {
        shot.writePng("frames/front.1004.png", 128, 96);
        refused("shot.json at /views/0/rendered/1004", "128x96", "48x64");
    }

    @Test
    void pngCutShort() throws IOException {
        byte[] whole = Files.readAllBytes(shot.folder().resolve("frames/front.1004.png"));
        shot.write("frames/front.1004.png", Arrays.copyOf(whole, whole.length / 2));
        refused("shot.json at /views/0/rendered/1004", "frames/front.1004.png");
    }

    @Test
    void pngWithABrokenByte() throws IOException {
        byte[] whole = Files.readAllBytes(shot.folder().resolve("frames/front.1004.png"));
        whole[whole.length / 2] ^= 0x55;
        shot.write("frames/front.1004.png", whole);
        refused("shot.json at /views/0/rendered/1004", "frames/front.1004.png");
    }

    @Test
    void pictureThatIsNotAPicture() {
        shot.write("frames/front.1004.png", "not a picture");
        refused("shot.json at /views/0/rendered/1004", "frames/front.1004.png");
    }

    @Test
    void gridThatCannotFitTheMemoryGiven() {
        shot.swap("shot.json", "[8, 16, 8]", "[256, 512, 256]");
        refused(List.of("--memory", "1G"), "shot.json at /grid/cells", "256 x 512 x 256", "1.0 GiB", "make it ", "or give more memory");
    }

    @Test
    void gridBeyondAllArrays() {
        shot.swap("shot.json", "[8, 16, 8]", "[8000, 8000, 8000]");
        refused(List.of("--memory", "1G"), "shot.json at /grid/cells", "make it ", "or give more memory");
    }

    @Test
    void rasterBeyondTheMemoryGiven() {
        shot.swap("shot.json", "\"raster\": [48, 64],\n      \"rendered\"", "\"raster\": [12000, 16000],\n      \"rendered\"");
        refused(List.of("--memory", "1G"), "shot.json at /views/0/raster", "12000x16000", "1.0 GiB");
    }

    /** A PNG of 100 bytes that states 12000 x 16000 pixels: refused before any memory is taken for them. */
    @Test
    void pngThatStatesASizeBeyondTheMemoryGiven() throws IOException {
        byte[] whole = Files.readAllBytes(shot.folder().resolve("frames/front.1004.png"));
        ByteBuffer.wrap(whole).putInt(16, 12000).putInt(20, 16000);
        shot.write("frames/front.1004.png", Arrays.copyOf(whole, 100));
        refused(List.of("--memory", "1G"), "shot.json at /views/0/rendered/1004", "12000x16000", "1.0 GiB");
    }

    @Test
    void fileTooLargeToBeAShot() {
        shot.write("shot.json", new byte[(16 << 20) + 1]);
        refused("shot.json", "16777217 bytes", "at most 16777216");
    }

    @Test
    void viewThatDoesNotSeeTheBox() {
        shot.swap("shot.json", "\"positionMetres\": [1, 2, 8], \"aimMetres\": [1, 2, 1]",
                "\"positionMetres\": [1, 2, 8], \"aimMetres\": [1, 2, 20]");
        refused("shot.json at /views/0", "no pixel sees the box");
    }

    @Test
    void pathThatClimbsOut() {
        shot.swap("shot.json", "frames/front.1004.png", "../front.1004.png");
        refused("shot.json at /views/0/rendered/1004", "leaves the shot folder");
    }

    @Test
    void absolutePath() {
        shot.swap("shot.json", "frames/front.1004.png", "/etc/hostname");
        refused("shot.json at /views/0/rendered/1004", "leaves the shot folder");
    }

    @Test
    void linkThatLeadsOut() throws IOException {
        Path outside = place.resolve("outside.png");
        Files.move(shot.folder().resolve("frames/front.1004.png"), outside);
        Files.createSymbolicLink(shot.folder().resolve("frames/front.1004.png"), outside);
        refused("shot.json at /views/0/rendered/1004", "leads out of the shot folder");
    }

    @Test
    void twoViewsOfOneName() {
        shot.swap("shot.json", "\"name\": \"side\"", "\"name\": \"front\"");
        shot.swap("notes/open.json", "\"view\": \"side\"", "\"view\": \"front\"");
        refused("shot.json at /views/1/name", "a second time");
    }

    @Test
    void sourceOutsideTheBox() {
        shot.swap("shot.json", "\"centreMetres\": [1, 0.6, 1]", "\"centreMetres\": [1, 60, 1]");
        refused("shot.json at /sources/0", "outside the box");
    }

    @Test
    void upAlongTheAxis() {
        shot.swap("shot.json", "\"up\": [0, 1, 0]", "\"up\": [0, 0, 1]");
        refused("shot.json at /views/0", "up");
    }

    @Test
    void handlesOnOneLine() {
        shot.swap("notes/lean.json", "{\"pin\": [0.45, 0.98]}", "{\"pin\": [0.335, 0.89]}");
        refused("notes/lean.json at /retouch/0/meshWarp", "one line");
    }

    private static final String WARP = "{\"meshWarp\": {\"handles\": [{\"from\": [0.37, 0.8], \"to\": [0.31, 0.8]}, "
            + "{\"pin\": [0.3, 0.98]}, {\"pin\": [0.45, 0.98]}]}}";

    private void swapWarp(String now) {
        shot.swap("notes/lean.json", WARP, now.replace('\'', '"'));
    }

    @Test
    void unknownKindOfWarp() {
        shot.swap("notes/lean.json", "{\"handles\"", "{\"kind\": \"elastic\", \"handles\"");
        refused("notes/lean.json at /retouch/0/meshWarp/kind", "\"elastic\"", "\"as rigid as possible\"", "\"similarity\"");
    }

    @Test
    void cellsWithoutAMesh() {
        shot.swap("notes/lean.json", "{\"handles\"", "{\"cells\": [10, 10], \"handles\"");
        refused("notes/lean.json at /retouch/0/meshWarp/cells", "no mesh");
    }

    @Test
    void tooManyCells() {
        shot.swap("notes/lean.json", "{\"handles\"", "{\"kind\": \"as rigid as possible\", \"cells\": [10, 1000], \"handles\"");
        refused("notes/lean.json at /retouch/0/meshWarp/cells/1", "found 1000", "3 to 64");
    }

    @Test
    void gridBesideHandles() {
        shot.swap("notes/lean.json", "{\"handles\"", "{\"grid\": {}, \"handles\"");
        refused("notes/lean.json at /retouch/0/meshWarp", "both 'handles' and 'grid'");
    }

    @Test
    void gridWithNoPlace() {
        swapWarp("{'meshWarp': {'grid': {'columns': 2, 'rows': 2, 'moved': [{'corner': [1, 1], 'to': [0.4, 0.5]}]}}}");
        refused("notes/lean.json at /retouch/0/meshWarp/grid", "no place", "'box'");
    }

    @Test
    void gridCornerThatIsNotThere() {
        swapWarp("{'meshWarp': {'grid': {'columns': 2, 'rows': 2, 'box': {'left': 0.1, 'top': 0.1, 'right': 0.5, 'bottom': 0.9}, "
                + "'moved': [{'corner': [1, 3], 'to': [0.4, 0.5]}]}}}");
        refused("notes/lean.json at /retouch/0/meshWarp/grid/moved/0/corner/1", "found 3", "0 to 2");
    }

    @Test
    void outlineLevelOutOfRange() {
        swapWarp("{'outline': {'level': 1, 'drags': [{'from': [0.3, 0.5], 'to': [0.25, 0.5]}]}}");
        refused("notes/lean.json at /retouch/0/outline", "level 1.0", "below 1");
    }

    @Test
    void outlineWithNothingDragged() {
        swapWarp("{'outline': {'drags': []}}");
        refused("notes/lean.json at /retouch/0/outline/drags", "a list of 0 values");
    }

    @Test
    void outlineWithAnUnknownKey() {
        swapWarp("{'outline': {'drag': [{'from': [0.3, 0.5], 'to': [0.25, 0.5]}]}}");
        refused("notes/lean.json at /retouch/0/outline/drag", "unknown key 'drag'", "did you mean 'drags'");
    }

    @Test
    void severalFaultsAreAllFound() {
        shot.swap("shot.json", "\"buoyancy\": 3.0", "\"buoyancy\": NaN");
        shot.swap("shot.json", "\"extinctionPerMetre\": 6", "\"extinctionPerMetre\": -6");
        shot.swap("notes/lean.json", "\"weight\"", "\"wieght\"");
        Run run = Run.of("check", shot.folder().toString(), "--json");
        assertEquals(3, run.code());
        assertEquals(3, run.err().lines().count(), run.err());
        assertTrue(run.out().contains("\"pointer\" : \"/flow/buoyancy\"") && run.out().contains("\"file\" : \"notes/lean.json\""),
                run.out());
    }

    private void refused(String... phrases) {
        refused(List.of(), phrases);
    }

    private void refused(List<String> options, String... phrases) {
        Refused.byAll(shot, place, options, phrases);
    }

    private static void assertOneSentence(String err, String... phrases) {
        Refused.assertOneSentence(err, phrases);
    }
}
