package org.wispwright.optimize.solve;

import java.util.List;
import java.util.Optional;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.optimize.flow.Side;
import org.wispwright.optimize.flow.Sides;
import org.wispwright.optimize.flow.Source;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.Solid;
import org.wispwright.render.march.Look;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.warp.loss.LossChoice;
import org.wispwright.warp.loss.LossKind;

/**
 * The scenes of the race, invented for it: a plume of 30 frames in a box of 2.67 x 4 x 2.67 m with five open sides, two notes. All are
 * solved with the pyramid loss alone, so that what is made small and what is measured differ by the stay term only.
 */
enum RaceScene {
    /** The silhouette bent by 0.45 widths of the plume's head on two frames of one view. */
    LEAN,
    /** A ball above the source, a little to the left; the plume passes on its right and is wanted on its left. */
    BALL,
    /** Bent to the right in one view and, a few frames before, to the right in another that is square to it. */
    CROSS;

    private static final double HEIGHT = 4;
    private static final double WIDTH = HEIGHT * 2 / 3;
    private static final double SOURCE_HEIGHT = 0.5;
    /** About where the plume's head is on the last frame, and how wide it is there. */
    private static final double HEAD_HEIGHT = 2.7;
    private static final double HEAD_WIDTH = 1.2;
    private static final FrameRange FRAMES = new FrameRange(1001, 1030, 20);

    /** @param n cells along x and z, even; half as many again along y */
    SolveProblem problem(int n) {
        GridShape grid = new GridShape(n, n * 3 / 2, n, WIDTH / n);
        double mid = WIDTH / 2;
        Sides sides = new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.OPEN, Side.OPEN, Side.OPEN);
        FlowSetup flow = new FlowSetup(grid, FRAMES, 1, Interpolation.LINEAR, Interpolation.LINEAR, sides, 9, 0.1,
                List.of(new Source("pot", mid, SOURCE_HEIGHT, mid, 0.4, 0.25, 8, FRAMES.first(), FRAMES.last())));
        Vec3 aim = new Vec3(mid, HEIGHT / 2, mid);
        Vec3 up = new Vec3(0, 1, 0);
        Raster raster = new Raster(n, n * 3 / 2);
        View front = new View("front", new Orthographic(WIDTH, HEIGHT), new Vec3(mid, HEIGHT / 2, 9), aim, up, raster);
        View side = new View("side", new Orthographic(WIDTH, HEIGHT), new Vec3(9, HEIGHT / 2, mid), aim, up, raster);
        Look look = new Look(4, Rgb.grey(0.9), Rgb.grey(0.7), Optional.empty());
        double bend = 0.45 * HEAD_WIDTH;
        return switch (this) {
            case LEAN -> new SolveProblem(flow, List.of(front), look, List.of(note(1020, 0, bend), note(1030, 0, bend)), List.of());
            case BALL -> new SolveProblem(flow.withObstacles(List.of(new Obstacle("ball", new Solid.Ball(0.3),
                    Curve.still(new Vec3(mid - 0.15, 1.5, mid)), Curve.still(new Vec3(0, 0, 0))))),
                    List.of(front), look, List.of(note(1024, 0, -bend), note(1030, 0, -bend)), List.of());
            case CROSS -> new SolveProblem(flow, List.of(front, side), look,
                    List.of(note(1030, 0, bend), note(1026, 1, bend)), List.of());
        };
    }

    private static SolveProblem.Note note(int frame, int view, double bend) {
        return new SolveProblem.Note("bend-" + frame, frame, view, 1, bent(bend));
    }

    /**
     * The picture moved to the right by {@code metres ((y - source) / (head - source))^2} at the height y, nothing below the source.
     */
    private static Wish bent(double metres) {
        return new Wish() {
            @Override
            public Picture wanted(Picture original) {
                int w = original.width();
                int h = original.height();
                Picture out = new Picture(w, h);
                for (int y = 0; y < h; y++) {
                    double up = Math.max(0, HEIGHT * (1 - (y + 0.5) / h) - SOURCE_HEIGHT) / (HEAD_HEIGHT - SOURCE_HEIGHT);
                    double right = metres * up * up * h / HEIGHT;
                    for (int x = 0; x < w; x++) {
                        int x0 = (int) Math.floor(x - right);
                        float f = (float) (x - right - x0);
                        for (int c = 0; c < 4; c++) {
                            out.rgba()[4 * (x + w * y) + c] = (1 - f) * at(original, x0, y, c) + f * at(original, x0 + 1, y, c);
                        }
                    }
                }
                return out;
            }

            @Override
            public float[] weights(Picture original) {
                float[] weights = new float[original.width() * original.height()];
                java.util.Arrays.fill(weights, 1f);
                return weights;
            }

            @Override
            public LossChoice losses(Picture original, Picture wanted) {
                return new LossChoice(List.of(LossKind.PYRAMID), "the race has one measure");
            }
        };
    }

    private static float at(Picture picture, int x, int y, int c) {
        return x >= 0 && x < picture.width() ? picture.at(x, y, c) : 0;
    }
}
