package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assertions.fail;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.BrushedMatte;
import org.wispwright.warp.matte.CombinedMatte;
import org.wispwright.warp.matte.DensityRange;
import org.wispwright.warp.matte.ImageMatte;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Sweep;

/**
 * Every operation within a matte of every kind changes nothing where the matte is 0, something where it is not, and a stroke says where.
 */
class WithinMatteTest {
    static List<Matte> mattes() {
        float[] half = new float[12 * 16];
        for (int p = 0; p < half.length; p++) {
            half[p] = p % 12 < 6 ? 1 : 0;
        }
        Matte density = new DensityRange(0.3, 0.8, 0.1, 0.02);
        Matte image = new ImageMatte(12, 16, half, 0.04);
        Matte brushed = new BrushedMatte(List.of(new BrushedMatte.Dab(BrushedMatte.Way.ADD,
                new Sweep(0.12, 1, 0.5, List.of(new Point(0.3, 0.25), new Point(0.45, 0.3))))));
        Matte left = new CombinedMatte(CombinedMatte.Way.SUBTRACT,
                List.of(new Region.Ellipse(new Point(0.38, 0.3), 0.2, 0.2, 0.02), brushed, density));
        return List.of(density, image, brushed, left, new CombinedMatte(CombinedMatte.Way.INVERSE, List.of(image)));
    }

    @ParameterizedTest
    @MethodSource("mattes")
    void nothingChangesWhereTheMatteIsZero(Matte matte) {
        Picture original = RetoucherTest.smoke(96);
        float[] values = matte.values(original);
        List<Operation> operations = new ArrayList<>();
        List<Point> line = List.of(new Point(0.25, 0.2), new Point(0.45, 0.3), new Point(0.4, 0.5));
        for (Brush brush : Brush.values()) {
            operations.add(new Stroke(brush, 0.3, 1, 0.5, line, Optional.of(matte)));
        }
        operations.add(new MeshWarp(List.of(new Handle(new Point(0.38, 0.3), new Point(0.33, 0.36)), Handle.pin(new Point(0, 1)),
                Handle.pin(new Point(0.75, 0.9))), Optional.of(matte)));
        Stroke before = new Stroke(Brush.SOFTEN, 0.5, 1, 0.5, line, Optional.empty());
        Picture start = Retoucher.wanted(new Retouch(List.of(before)), original);
        for (Operation operation : operations) {
            Picture wanted = Retoucher.wanted(new Retouch(List.of(before, operation)), original);
            float[] touched = Retoucher.touched(new Retouch(List.of(operation)), original, 0);
            double most = 0;
            for (int p = 0; p < values.length; p++) {
                double change = 0;
                for (int n = 4 * p; n < 4 * p + 4; n++) {
                    change = Math.max(change, Math.abs(wanted.rgba()[n] - start.rgba()[n]));
                }
                // A warp's touched goes by the displacement, not by what it changes: RetoucherTest.
                if (values[p] == 0 && change > 0 || operation instanceof Stroke && change >= 0.01 && touched[p] < 0.5) {
                    fail(operation + " at pixel " + p + " changes " + change + ", matte " + values[p] + ", touched " + touched[p]);
                }
                most = Math.max(most, change);
            }
            double seen = most;
            assertTrue(most > 0.002, () -> operation + " changes at most " + seen + ", so this test could not fail");
        }
    }
}
