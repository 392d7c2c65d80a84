package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.loss.PictureMeasure;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;

/**
 * The same retouch at 256, 512 and 2048 rows agrees after down-sampling: mean absolute difference at most 0.003, over the whole
 * picture for all operations in one retouch, and over the pixels that the stroke touches for each brush alone.
 */
class RasterAgreementTest {
    private static final double MOST = 0.003;
    private static final Picture AT_256 = RetoucherTest.smoke(256);
    private static final Picture AT_512 = RetoucherTest.smoke(512);
    private static final Picture AT_2048 = RetoucherTest.smoke(2048);

    @Test
    void allOperationsTogether() {
        float[] ones = new float[192 * 256];
        Arrays.fill(ones, 1f);
        assertAgrees("everything", RetoucherTest.everything(), AT_256, ones);
    }

    /** Before the stroke comes a removal at another place, so that restore has something to bring back. */
    @ParameterizedTest
    @EnumSource(Brush.class)
    void eachBrush(Brush brush) {
        Stroke before = new Stroke(Brush.REMOVE, 0.1, 0.7, 0.6, List.of(new Point(0.36, 0.3), new Point(0.42, 0.45)), Optional.empty());
        Stroke stroke = new Stroke(brush, 0.07, 0.9, 0.5, List.of(new Point(0.3, 0.25), new Point(0.42, 0.35), new Point(0.36, 0.5)),
                Optional.empty());
        assertAgrees(brush.name(), new Retouch(List.of(before, stroke)), Retoucher.wanted(new Retouch(List.of(before)), AT_256),
                Retoucher.touched(new Retouch(List.of(stroke)), AT_256, 0));
    }

    /** A pull of the head, pinned at the foot and the corners, over the pixels that it touches. */
    @ParameterizedTest
    @EnumSource(WarpKind.class)
    void eachKindOfMeshWarp(WarpKind kind) {
        List<Handle> handles = List.of(new Handle(new Point(0.38, 0.3), new Point(0.27, 0.33)), Handle.pin(new Point(0.3, 0.7)),
                Handle.pin(new Point(0.45, 0.7)), Handle.pin(new Point(0.37, 0.95)), Handle.pin(new Point(0.02, 0.02)),
                Handle.pin(new Point(0.73, 0.02)));
        for (Optional<Matte> within : List.<Optional<Matte>>of(Optional.empty(),
                Optional.of(new Region.Ellipse(new Point(0.34, 0.34), 0.3, 0.33, 0.1)))) {
            Retouch retouch = new Retouch(List.of(new MeshWarp(kind, handles, Cells.USUAL, within)));
            assertAgrees(kind + " " + within, retouch, AT_256, Retoucher.touched(retouch, AT_256, 0));
        }
    }

    /** The head's right side pulled out; the outline is found anew at each raster. */
    @ParameterizedTest
    @EnumSource(WarpKind.class)
    void anOutline(WarpKind inside) {
        Retouch retouch = new Retouch(List.of(new OutlineWarp(0.3, List.of(new Handle(new Point(0.5, 0.3), new Point(0.57, 0.27))), 0.1,
                inside, Optional.empty())));
        assertAgrees("outline " + inside, retouch, AT_256, Retoucher.touched(retouch, AT_256, 0));
    }

    /** A paint-over of 320 rows, finer than one raster and coarser than the others. */
    @Test
    void aPaintOver() {
        Retouch retouch = new Retouch(List.of(RepaintTest.painted(320)));
        assertAgrees("paint-over", retouch, AT_256, Retoucher.touched(retouch, AT_256, 0));
    }

    private static void assertAgrees(String what, Retouch retouch, Picture without, float[] weights) {
        Picture at256 = Retoucher.wanted(retouch, AT_256);
        Picture at512 = RetoucherTest.halved(Retoucher.wanted(retouch, AT_512));
        Picture at2048 = Retoucher.wanted(retouch, AT_2048);
        while (at2048.height() > 256) {
            at2048 = RetoucherTest.halved(at2048);
        }
        double changed = PictureMeasure.meanAbsoluteDifference(without, at256, weights);
        double low = PictureMeasure.meanAbsoluteDifference(at256, at2048, weights);
        double middle = PictureMeasure.meanAbsoluteDifference(at512, at2048, weights);
        double between = PictureMeasure.meanAbsoluteDifference(at256, at512, weights);
        String seen = what + ": changes " + changed + "; 256 against 2048 rows " + low + ", 512 against 2048 " + middle
                + ", 256 against 512 " + between;
        assertTrue(changed > 5 * MOST, seen + ": too little for this test to fail");
        assertTrue(low <= MOST && middle <= MOST && between <= MOST, seen);
    }
}
