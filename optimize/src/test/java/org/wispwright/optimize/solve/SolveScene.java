package org.wispwright.optimize.solve;

import java.util.List;
import java.util.Optional;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.optimize.flow.Side;
import org.wispwright.optimize.flow.Sides;
import org.wispwright.optimize.flow.Source;
import org.wispwright.render.march.Look;
import org.wispwright.render.march.Light;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Pinhole;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;

/** A small plume in a box of 2 x 2.5 x 2 m, invented for the tests of the solve. */
final class SolveScene {
    static final View FRONT = new View("front", new Pinhole(50, 32, 40), new Vec3(1, 1.25, 6), new Vec3(1, 1.25, 1), new Vec3(0, 1, 0), new Raster(64, 80));
    static final View SIDE = new View("side", new Orthographic(2, 2.5), new Vec3(6, 1.25, 1), new Vec3(1, 1.25, 1), new Vec3(0, 1, 0), new Raster(64, 80));

    private SolveScene() { }

    static FlowSetup flow(int n, int lastFrame, int substeps, Interpolation density) {
        GridShape box = new GridShape(n, n * 5 / 4, n, 2.0 / n);
        Sides sides = new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.OPEN, Side.OPEN, Side.OPEN);
        return new FlowSetup(box, new FrameRange(1001, lastFrame, 12), substeps, Interpolation.LINEAR, density, sides, 9, 0.1,
                List.of(new Source("pot", 1, 0.35, 1, 0.4, 0.25, 8, 1001, lastFrame)));
    }

    static Look look(boolean light) {
        return new Look(4, new Rgb(.9, .85, .8), new Rgb(.5, .5, .6),
                light ? Optional.of(new Light(new Vec3(.4, .8, .3), new Rgb(.8, .7, .6))) : Optional.empty());
    }

    /** The picture moved to the left by a share of its height, more the higher up; clear where nothing comes from. */
    static Wish lean(double share) {
        return new Wish() {
            @Override public Picture wanted(Picture original) {
                int w = original.width();
                int h = original.height();
                Picture out = new Picture(w, h);
                for (int y = 0; y < h; y++) {
                    double up = Math.max(0, 0.9 - (y + .5) / h);
                    double from = share * h * up * up;
                    for (int x = 0; x < w; x++) {
                        int x0 = (int) Math.floor(x + from);
                        float f = (float) (x + from - x0);
                        for (int c = 0; c < 4; c++) {
                            float a = x0 < w ? original.at(x0, y, c) : 0;
                            float b = x0 + 1 < w ? original.at(x0 + 1, y, c) : 0;
                            out.rgba()[4 * (x + w * y) + c] = a + f * (b - a);
                        }
                    }
                }
                return out;
            }

            @Override public float[] weights(Picture original) {
                float[] weights = new float[original.width() * original.height()];
                java.util.Arrays.fill(weights, 1f);
                return weights;
            }
        };
    }

    static SolveProblem problem(int n, int lastFrame, int substeps, boolean light) {
        return new SolveProblem(flow(n, lastFrame, substeps, Interpolation.LINEAR), List.of(FRONT, SIDE), look(light),
                List.of(new SolveProblem.Note("lean", lastFrame - 2, 0, 1, lean(0.25))),
                List.of(new SolveProblem.Hold("foot", 0, List.of(new SolveProblem.Span(1001, lastFrame)), SolveProblem.Held.PICTURE, 1, original -> {
                    int w = original.width();
                    int h = original.height();
                    float[] weights = new float[w * h];
                    java.util.Arrays.fill(weights, w * (h - h / 5), w * h, 1f);
                    return weights;
                })));
    }
}
