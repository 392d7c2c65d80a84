package org.wispwright.ui.shot;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;
import org.wispwright.warp.matte.BrushedMatte;
import org.wispwright.warp.matte.CombinedMatte;
import org.wispwright.warp.matte.DensityRange;
import org.wispwright.warp.matte.ImageMatte;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Sweep;

/** Every key of a matte ends up in the value it names (docs/shot-folder.md), and what is left out has the default that stands there. */
class MatteReaderTest {
    private static final Region BOX = new Region.Rectangle(0, 0.25, 0.5, 1, 0.02);
    private static final String BOX_TEXT = "{'rectangle': {'left': 0, 'top': 0.25, 'right': 0.5, 'bottom': 1}}";

    @TempDir
    private Path folder;

    private Matte read(String text) throws IOException {
        Files.writeString(folder.resolve("shot.json"), "{}");
        MattePictures pictures = new MattePictures(ShotFolder.open(folder), 1L << 30);
        return MatteReader.matte(JsonDoor.parse("a.json", text.replace('\'', '"').getBytes(StandardCharsets.UTF_8)).with(pictures));
    }

    @Test
    void everyKeyAndEveryDefault() throws IOException {
        assertEquals(BOX, read(BOX_TEXT));
        assertEquals(new DensityRange(0.2, 0.8, 0.3, 0.05), read("{'density': {'from': 0.2, 'to': 0.8, 'soft': 0.3}, 'feather': 0.05}"));
        assertEquals(new DensityRange(0, 1, 0.1, 0), read("{'density': {}}"));
        assertEquals(new BrushedMatte(List.of(
                new BrushedMatte.Dab(BrushedMatte.Way.ADD, new Sweep(0.1, 1, 0.5, List.of(new Point(0.1, 0.2)))),
                new BrushedMatte.Dab(BrushedMatte.Way.TAKE, new Sweep(0.2, 0.75, 0, List.of(new Point(0, 1), new Point(0.5, 0.5)))))),
                read("{'brushed': [{'brush': 'add', 'radius': 0.1, 'line': [[0.1, 0.2]]},"
                        + "{'brush': 'take', 'radius': 0.2, 'strength': 0.75, 'softEdge': 0, 'line': [[0, 1], [0.5, 0.5]]}]}"));
        for (CombinedMatte.Way way : List.of(CombinedMatte.Way.UNION, CombinedMatte.Way.INTERSECT, CombinedMatte.Way.SUBTRACT)) {
            assertEquals(new CombinedMatte(way, List.of(BOX, new DensityRange(0, 1, 0.1, 0))),
                    read("{'" + JsonPlace.word(way) + "': [" + BOX_TEXT + ", {'density': {}}]}"));
        }
        assertEquals(new CombinedMatte(CombinedMatte.Way.INVERSE, List.of(BOX)), read("{'inverse': " + BOX_TEXT + "}"));
    }

    /**
     * By hand: an 8-bit file of linear light 0.2158605 over alpha 128/255 has colour code 128, so over black it counts encode(0.2158605
     * 128/255).
     */
    @Test
    void aPictureByEitherChannelAndOnlyOnce() throws IOException {
        float a = 128 / 255f;
        PngFile.write(new Picture(2, 1, new float[] {1, 1, 1, 1, 0.2158605f * a, 0.2158605f * a, 0.2158605f * a, a}),
                folder.resolve("m.png"),
                PngFile.Depth.EIGHT);
        ImageMatte grey = (ImageMatte) read("{'image': {'file': 'm.png'}, 'feather': 0.1}");
        assertEquals(0.1, grey.feather());
        // IEC 61966-2-1: 1.055 (0.2158605 128/255)^(1/2.4) - 0.055 = 0.36293.
        assertArrayEquals(new float[] {1, 0.36293f}, grey.pixels(), 1e-5f);
        ImageMatte alpha = (ImageMatte) read("{'image': {'file': 'm.png', 'channel': 'alpha'}}");
        assertArrayEquals(new float[] {1, a}, alpha.pixels(), 1e-6f);
        assertEquals(0, alpha.feather());
        CombinedMatte both = (CombinedMatte) read("{'union': [{'image': {'file': 'm.png'}}, {'image': {'file': 'm.png'}, 'feather': "
                + "0.2}]}");
        assertSame(((ImageMatte) both.parts().get(0)).pixels(), ((ImageMatte) both.parts().get(1)).pixels());
    }
}
