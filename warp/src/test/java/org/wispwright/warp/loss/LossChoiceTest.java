package org.wispwright.warp.loss;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.wispwright.warp.loss.LossPictures.blob;
import static org.wispwright.warp.loss.LossPictures.ones;
import static org.wispwright.warp.loss.LossPictures.waves;

import java.util.List;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import org.wispwright.render.picture.Picture;

/** Which losses a note gets, from its two pictures; expectations by hand or ours, as said beside each. */
class LossChoiceTest {
    private static final List<LossKind> PYRAMID = List.of(LossKind.PYRAMID);
    private static final List<LossKind> BOTH = List.of(LossKind.PYRAMID, LossKind.TRANSPORT);

    /** By hand: along a small shift the squared error is a bowl, J = (1 - t)^2, whose slope at its rim is -2 J. */
    @Test
    void leadIsTwoInABowl() {
        assertEquals(2, RetouchMeasure.of(blob(96, 64, 40, 30, 8, 1), blob(96, 64, 41, 30, 8, 1)).lead(), 0.06);
        assertEquals(2, RetouchMeasure.of(blob(96, 64, 40, 30, 8, 1), blob(96, 64, 40.6, 29.2, 8, 1)).lead(), 0.06);
    }

    /**
     * By hand: for a Gaussian moved by d, plain squared error falls by (d^2 / 2 s^2) e / (1 - e), e = exp(-d^2 / 4 s^2), along the
     * whole way. 8 to 15 rows are one level of the pyramid, so there lead is that, to a tenth of the bowl's 2: sixteen
     * directions carry not quite evenly.
     */
    @ParameterizedTest
    @CsvSource({"1", "2", "3", "5"})
    void leadOnOneLevelIsKnown(double d) {
        double s = 1.5;
        double e = Math.exp(-d * d / (4 * s * s));
        assertEquals(d * d / (2 * s * s) * e / (1 - e),
                RetouchMeasure.of(blob(60, 15, 20, 7, s, 1), blob(60, 15, 20 + d, 7, s, 1)).lead(), 0.2);
    }

    /** Ours: however large the frame, smoke within sight of the pyramid gets it alone, smoke three widths off gets the transport. */
    @ParameterizedTest
    @CsvSource({"32", "96", "270"})
    void carriedFarOrNear(int height) {
        int width = 2 * height;
        double s = 0.05 * height;
        Picture puff = blob(width, height, .4 * height, .5 * height, s, .9);
        assertEquals(PYRAMID, LossChoice.of(puff, blob(width, height, .4 * height + 2 * s, .5 * height, s, .9)).kinds());
        assertEquals(BOTH, LossChoice.of(puff, blob(width, height, .4 * height + 12 * s, .5 * height, s, .9)).kinds());
    }

    /** Ours: a standing cloud beside it must not hide that a puff is carried out of sight. */
    @Test
    void standingSmokeBesideDoesNotHideIt() {
        Picture cloud = blob(128, 64, 105, 36, 9, 1);
        LossChoice choice = LossChoice.of(both(cloud, blob(128, 64, 20, 30, 3, .9)), both(cloud, blob(128, 64, 60, 30, 3, .9)));
        assertEquals(BOTH, choice.kinds());
        assertTrue(choice.why().contains("farther"), choice.why());
    }

    /** Ours: smoke that is added or taken away has nowhere to be carried from or to. */
    @Test
    void smokeThatComesOrGoes() {
        Picture cloud = blob(96, 64, 40, 36, 9, 1);
        Picture more = both(cloud, blob(96, 64, 80, 20, 4, .9));
        assertEquals(PYRAMID, LossChoice.of(cloud, more).kinds());
        assertEquals(PYRAMID, LossChoice.of(more, cloud).kinds());
        assertEquals(0, RetouchMeasure.of(more, cloud).balance());
        assertEquals(PYRAMID, LossChoice.of(new Picture(96, 64), cloud).kinds());
        assertEquals(PYRAMID, LossChoice.of(cloud, new Picture(96, 64)).kinds());
    }

    /** Ours: contrast inside the smoke moves no outline. By hand: nothing of that change is outside both silhouettes. */
    @Test
    void contrastInside() {
        Picture original = waves(96, 64, 1);
        Picture wanted = changed(original, a -> .5 + 1.4 * (a - .5));
        assertEquals(PYRAMID, LossChoice.of(original, wanted).kinds());
        assertEquals(1, RetouchMeasure.of(changed(original, a -> .4 + .5 * a), changed(original, a -> .5 + .3 * a)).inside());
    }

    /** By hand: a box of 2 x 1 pixels that change, in 20 rows a feather of 2 pixels: 1, a half, 0 beside it; 1 where none changes. */
    @Test
    void spanByHand() {
        Picture original = new Picture(30, 20);
        Picture wanted = new Picture(30, 20);
        original.rgba()[4 * (10 + 30 * 7) + 3] = 1;
        wanted.rgba()[4 * (11 + 30 * 7) + 3] = .5f;
        wanted.rgba()[4 * (25 + 30 * 17) + 3] = .01f;
        float[] span = RetouchMeasure.span(original, wanted);
        assertEquals(1, span[10 + 30 * 7]);
        assertEquals(1, span[11 + 30 * 7]);
        assertEquals(.5f, span[12 + 30 * 7]);
        assertEquals(.5f, span[10 + 30 * 6]);
        assertEquals(.25f, span[9 + 30 * 8]);
        assertEquals(0, span[13 + 30 * 7]);
        assertEquals(0, span[25 + 30 * 17]);
        assertEquals(1, RetouchMeasure.span(original, original)[0]);
    }

    /** Ours: smoke outside the span of the change has no part in the transport. */
    @Test
    void transportLooksAtTheSpanAlone() {
        Picture from = blob(128, 64, 20, 30, 3, .9);
        Picture to = blob(128, 64, 60, 30, 3, .9);
        Picture cloud = blob(128, 64, 120, 36, 3, 1);
        double alone = LossKind.TRANSPORT.of(from, to, ones(128, 64)).value(from);
        assertEquals(alone, LossKind.TRANSPORT.of(from, to, ones(128, 64)).value(both(from, cloud)), 1e-6 * alone);
        assertEquals(40.0 * 40 / (64 * 64) / 2, alone, .02 * alone);
    }

    /** Every kind is 0 at the wanted picture and above 0 at a moved one; its value sees the note's weights where it should. */
    @ParameterizedTest
    @EnumSource(LossKind.class)
    void everyKindIsLeastAtTheWantedPicture(LossKind kind) {
        Picture original = blob(48, 40, 18, 20, 5, .2);
        Picture wanted = blob(48, 40, 26, 18, 5, .2);
        PictureLoss loss = kind.of(original, wanted, ones(48, 40));
        assertEquals(0, loss.value(wanted), 1e-9);
        assertTrue(loss.value(original) > 1e-4, kind + " " + loss.value(original));
        if (kind != LossKind.TRANSPORT) {
            assertEquals(0, kind.of(original, wanted, new float[48 * 40]).value(original));
        }
    }

    @Test
    void sharesAndWords() {
        LossChoice choice = new LossChoice(List.of(LossKind.PYRAMID, LossKind.EDGES, LossKind.SILHOUETTE, LossKind.TRANSPORT), "asked");
        assertEquals(.25, choice.share(LossKind.EDGES));
        assertEquals(0, new LossChoice(PYRAMID, "").share(LossKind.EDGES));
        assertEquals("pyramid+edges+silhouette+transport", choice.inWords());
        assertThrows(IllegalArgumentException.class, () -> new LossChoice(List.of(), ""));
        assertThrows(IllegalArgumentException.class, () -> new LossChoice(List.of(LossKind.EDGES, LossKind.EDGES), ""));
        assertThrows(IllegalArgumentException.class, () -> LossChoice.of(new Picture(4, 5), new Picture(5, 4)));
    }

    private static Picture both(Picture a, Picture b) {
        Picture sum = a.copy();
        for (int n = 0; n < sum.rgba().length; n++) {
            sum.rgba()[n] = a.rgba()[n] + b.rgba()[n] - a.rgba()[n] * b.rgba()[n];
        }
        return sum;
    }

    private static Picture changed(Picture original, DoubleUnaryOperator by) {
        Picture out = original.copy();
        for (int n = 3; n < out.rgba().length; n += 4) {
            out.rgba()[n] = (float) by.applyAsDouble(out.rgba()[n]);
        }
        return out;
    }
}
