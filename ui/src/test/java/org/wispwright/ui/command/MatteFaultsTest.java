package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SortedMap;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** A matte with one fault, or a bad file for one, gets one sentence and exit code 3 from every command, and nothing on disk changes. */
class MatteFaultsTest {
    private static final String BRUSHED = "{\"brushed\": [{\"brush\": \"add\", \"radius\": 0.1, \"line\": [[0.3, 0.8]]}]}";

    @TempDir
    private Path place;
    private SmallShot shot;

    @BeforeEach
    void aGoodShotWithAMatteOfEveryKind() {
        shot = SmallShot.in(place.resolve("yard"));
        shot.writePng("mattes/head.png", 96, 128);
        weighBy("""
                {"subtract": [
                  {"union": [{"density": {"from": 0.1, "to": 0.9, "soft": 0.2}, "feather": 0.05}, %s]},
                  {"intersect": [{"inverse": {"ellipse": {"centre": [0.4, 0.4], "radii": [0.1, 0.1]}}},
                                 {"image": {"file": "mattes/head.png", "channel": "grey"}, "feather": 0.02}]}
                ]}""".formatted(BRUSHED));
    }

    /** Gives the note "lean" this matte to weigh by. */
    private void weighBy(String matte) {
        shot.write("notes/lean.json", SmallShot.LEAN.replace("\"weight\": 1,", "\"weight\": 1, \"weighBy\": " + matte + ","));
    }

    @Test
    void theShotItselfIsInOrder() {
        Run run = Run.of("check", shot.folder().toString());
        assertEquals(0, run.code(), run.err());
        Run off = Run.of("note", "off", shot.folder().toString(), "lean");
        assertEquals(0, off.code(), off.err());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '`', value = {
        "{} | /weighBy | 0 kinds of matte",
        "{'density': {}, 'brushed': []} | /weighBy | 2 kinds of matte",
        "{'densty': {}} | /weighBy/densty | did you mean 'density'",
        "{'density': {'form': 0.1}} | /weighBy/density/form | unknown key 'form'",
        "{'density': {'from': 0.6, 'to': 0.5}} | /weighBy/density | needs from below to",
        "{'density': {'from': -0.1}} | /weighBy/density/from | found -0.1",
        "{'density': {'to': 1.5}} | /weighBy/density/to | found 1.5",
        "{'density': {'soft': 0}} | /weighBy/density/soft | 0.01 to 1",
        "{'density': {}, 'feather': 5} | /weighBy/feather | 0 to 4",
        "{'brushed': []} | /weighBy/brushed | a list of 0 values",
        "{'brushed': [{'brush': 'take', 'radius': 0.1, 'line': [[0, 0]]}]} | /weighBy/brushed | takes away",
        "{'brushed': [{'brush': 'remove', 'radius': 0.1, 'line': [[0, 0]]}]} | /weighBy/brushed/0/brush | \"add\" or \"take\"",
        "{'brushed': [{'brush': 'add', 'radius': 0, 'line': [[0, 0]]}]} | /weighBy/brushed/0/radius | found 0",
        "{'brushed': [{'brush': 'add', 'radius': 0.1, 'line': [[0, 0]], 'within': {}}]} | /weighBy/brushed/0/within | unknown key",
        "{'brushed': [{'brush': 'add', 'radius': 0.1, 'line': [[0, 0]]}], 'feather': 0.1} | /weighBy/feather | softEdge",
        "{'union': [{'density': {}}]} | /weighBy/union | a list of 1 values",
        "{'intersect': {'density': {}}} | /weighBy/intersect | a list of 2 to 100",
        "{'subtract': [{'density': {}}, {'density': {'from': 2}}]} | /weighBy/subtract/1/density/from | found 2",
        "{'inverse': []} | /weighBy/inverse | an object",
        "{'inverse': {'density': {}}, 'feather': 0.1} | /weighBy/feather | the mattes inside",
        "{'image': {}} | /weighBy/image | no 'file'",
        "{'image': {'file': 3}} | /weighBy/image/file | text",
        "{'image': {'file': '../head.png'}} | /weighBy/image/file | leaves the shot folder",
        "{'image': {'file': '/etc/hostname'}} | /weighBy/image/file | leaves the shot folder",
        "{'image': {'file': 'mattes/none.png'}} | /weighBy/image/file | no such file",
        "{'image': {'file': 'mattes'}} | /weighBy/image/file | a folder",
        "{'image': {'file': 'shot.json'}} | /weighBy/image/file | is not a PNG or EXR file",
        "{'image': {'file': 'mattes/head.png', 'channel': 'red'}} | /weighBy/image/channel | \"grey\" or \"alpha\"",
        "{'image': {'file': 'mattes/head.png', 'channel': 'alpha'}} | /weighBy/image/file | opaque everywhere",
        "{'image': {'file': 'mattes/wide.png'}} | /weighBy/image/file | 128x96 pixels",
        "{'inverse': {'image': {'file': 'mattes/wide.png'}}} | /weighBy/inverse/image/file | the aspect of view 'front', 48x64"})
    void oneFault(String matte, String pointer, String phrase) {
        shot.writePng("mattes/wide.png", 128, 96);
        weighBy(matte.replace('\'', '"'));
        refused("notes/lean.json at " + pointer + ":", phrase);
    }

    @Test
    void nestedTooDeep() {
        String matte = BRUSHED;
        for (int n = 0; n < 9; n++) {
            matte = "{\"inverse\": " + matte + "}";
        }
        weighBy(matte);
        refused("notes/lean.json at /weighBy/inverse:", "9 deep", "at most 8");
    }

    @Test
    void pictureCutShort() throws IOException {
        byte[] whole = Files.readAllBytes(shot.folder().resolve("mattes/head.png"));
        shot.write("mattes/head.png", Arrays.copyOf(whole, whole.length / 2));
        refused("notes/lean.json at /weighBy/subtract/1/intersect/1/image/file", "mattes/head.png", "cut short");
        shot.write("mattes/head.png", Arrays.copyOf(whole, 20));
        refused("notes/lean.json at /weighBy/subtract/1/intersect/1/image/file", "cut short");
    }

    @Test
    void pictureWithABrokenByte() throws IOException {
        byte[] whole = Files.readAllBytes(shot.folder().resolve("mattes/head.png"));
        whole[whole.length / 2] ^= 0x55;
        shot.write("mattes/head.png", whole);
        refused("notes/lean.json at /weighBy/subtract/1/intersect/1/image/file", "damaged");
    }

    /** A PNG of 100 bytes that states 12000 x 16000 pixels: refused before any memory is taken for them; 20000 at any memory. */
    @Test
    void pictureThatStatesASizeBeyondTheMemoryGiven() throws IOException {
        byte[] whole = Files.readAllBytes(shot.folder().resolve("mattes/head.png"));
        ByteBuffer.wrap(whole).putInt(16, 12000).putInt(20, 16000);
        shot.write("mattes/head.png", Arrays.copyOf(whole, 100));
        refused(List.of("--memory", "1G"), "notes/lean.json at /weighBy/subtract/1/intersect/1/image/file", "12000x16000", "1.0 GiB");
        ByteBuffer.wrap(whole).putInt(16, 15000).putInt(20, 20000);
        shot.write("mattes/head.png", Arrays.copyOf(whole, 100));
        refused("notes/lean.json at /weighBy/subtract/1/intersect/1/image/file", "15000x20000", "at most 16384");
    }

    @Test
    void pictureOutsideByALink() throws IOException {
        Path outside = place.resolve("outside.png");
        Files.move(shot.folder().resolve("mattes/head.png"), outside);
        Files.createSymbolicLink(shot.folder().resolve("mattes/head.png"), outside);
        refused("notes/lean.json at /weighBy/subtract/1/intersect/1/image/file", "leads out of the shot folder");
    }

    /** A copy onto a view of another aspect is refused, because the picture does not fit there. */
    @Test
    void copyOntoAViewOfAnotherAspect() throws IOException {
        shot.swap("shot.json", "\"orthographicMetres\": [3, 4]", "\"orthographicMetres\": [4, 4]");
        shot.swap("shot.json", "\"aimMetres\": [1, 2, 1], \"raster\": [48, 64]\n    }\n", "\"aimMetres\": [1, 2, 1], \"raster\": [64, "
                + "64]\n    }\n");
        assertEquals(0, Run.of("check", shot.folder().toString()).code());
        Run copied = Run.of("note", "copy", shot.folder().toString(), "lean", "--frame", "1005");
        assertEquals(0, copied.code(), copied.err());
        SortedMap<String, String> before = SmallShot.listing(place);
        Run run = Run.of("note", "copy", shot.folder().toString(), "lean", "--frame", "1005", "--view", "side", "--id", "other");
        assertEquals(3, run.code(), run.err());
        assertTrue(run.err().contains("/image/file") && run.err().contains("view 'side', 64x64"), run.err());
        assertEquals(before, SmallShot.listing(place));
    }

    /** The alpha of a picture that has one is a matte. */
    @Test
    void alphaOfAPictureThatHasOne() throws IOException {
        BufferedImage image = new BufferedImage(48, 64, BufferedImage.TYPE_INT_ARGB);
        image.setRGB(20, 30, 0xC0FFFFFF);
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        ImageIO.write(image, "png", bytes);
        shot.write("mattes/head.png", bytes.toByteArray());
        weighBy("{\"image\": {\"file\": \"mattes/head.png\", \"channel\": \"alpha\"}}");
        assertEquals(0, Run.of("check", shot.folder().toString()).code());
    }

    private void refused(String... phrases) {
        refused(List.of(), phrases);
    }

    private void refused(List<String> options, String... phrases) {
        for (List<String> command : ShotCommands.on(shot.folder(), place.resolve("out"))) {
            SortedMap<String, String> before = SmallShot.listing(place);
            List<String> args = new ArrayList<>(command);
            args.addAll(options);
            Run run = Run.of(args.toArray(new String[0]));
            assertEquals(ExitCodes.BAD_INPUT, run.code(), args + ": " + run.err());
            String line = run.err().strip();
            assertEquals(1, line.lines().count(), line);
            assertTrue(line.startsWith("wispwright: ") && line.endsWith(".") && !line.contains("Exception"), line);
            for (String phrase : phrases) {
                assertTrue(line.contains(phrase), "'" + phrase + "' is not in: " + line);
            }
            assertEquals(before, SmallShot.listing(place), args + " changed something on disk");
        }
    }
}
