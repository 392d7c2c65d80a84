package org.wispwright.ui.sample;

import java.awt.Color;
import java.awt.GradientPaint;
import java.awt.Graphics2D;
import java.awt.Polygon;
import java.awt.RenderingHints;
import java.awt.image.BufferedImage;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.solve.Simulation;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.Light;
import org.wispwright.render.march.Look;
import org.wispwright.render.march.RayMarcher;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.picture.Srgb;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;

/**
 * Makes the kiln yard's rendered frames: what a production renderer might have sent, and on purpose not our look. Low warm sun from the
 * right, thicker smoke, finer steps, a painted sky, kiln and ground behind, a filmic curve, grain, no alpha.
 * <p>Run with the shot folder and the folder to write to: {@code java -cp <test class path>
 * org.wispwright.ui.sample.PaintKilnYardFrames samples/kiln-yard samples/kiln-yard/frames}.
 */
public final class PaintKilnYardFrames {
    private static final Raster RASTER = new Raster(540, 720);
    private static final Look LOOK = new Look(4.2, new Rgb(0.97, 0.94, 0.9), new Rgb(0.16, 0.2, 0.3),
            Optional.of(new Light(new Vec3(0.9, 0.45, 0.35), new Rgb(1.5, 1.05, 0.7))));

    private PaintKilnYardFrames() { }

    /** See above. */
    public static void main(String[] args) {
        Shot shot = ShotCheck.require(Path.of(args[0]), 2L << 30);
        Path out = Path.of(args[1]);
        List<Integer> frames = shot.notes().stream().map(note -> note.frame()).distinct().sorted().toList();
        View view = shot.view("front").orElseThrow().view().withRaster(RASTER);
        try (Lanes lanes = new Lanes(2)) {
            RayMarcher marcher = new RayMarcher(shot.flow().grid(), view, shot.flow().grid().cellMetres() / 4, lanes);
            Simulation.run(new SmokeSolver(shot.flow(), lanes), shot.flow().startState(), null, null, frames.get(frames.size() - 1),
                    () -> false, (frame, state, force) -> {
                if (frames.contains(frame)) {
                    Picture smoke = RASTER.picture();
                    marcher.picture(state.density(), LOOK, smoke);
                    write(smoke, frame, out.resolve("front." + frame + ".png"));
                }
            });
        }
    }

    private static void write(Picture smoke, int frame, Path file) {
        Picture yard = yard();
        Random grain = new Random(frame);
        for (int n = 0; n < smoke.width() * smoke.height(); n++) {
            double noise = 1 + 0.02 * grain.nextGaussian();
            float through = 1 - smoke.rgba()[4 * n + 3];
            for (int c = 0; c < 3; c++) {
                double light = (smoke.rgba()[4 * n + c] + through * yard.rgba()[4 * n + c]) * noise;
                smoke.rgba()[4 * n + c] = (float) Math.max(0, 1.04 * (1 - Math.exp(-1.25 * light)));
            }
            smoke.rgba()[4 * n + 3] = 1;
        }
        try {
            PngFile.write(smoke, file, PngFile.Depth.EIGHT);
        } catch (java.io.IOException refused) {
            throw new java.io.UncheckedIOException(refused);
        }
    }

    /** The yard behind the smoke, in linear light: evening sky, a kiln with its flue, the ground. */
    private static Picture yard() {
        int w = RASTER.width();
        int h = RASTER.height();
        BufferedImage image = new BufferedImage(w, h, BufferedImage.TYPE_INT_RGB);
        Graphics2D g = image.createGraphics();
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setPaint(new GradientPaint(0, 0, new Color(58, 78, 112), 0, h * 0.93f, new Color(214, 158, 118)));
        g.fillRect(0, 0, w, h);
        g.setColor(new Color(46, 40, 42));
        g.fillRect(0, (int) (0.962 * h), w, h);
        g.setColor(new Color(74, 50, 42));
        g.fillArc((int) (0.5 * w - 0.17 * h), (int) (0.915 * h), (int) (0.34 * h), (int) (0.2 * h), 0, 180);
        g.setColor(new Color(92, 62, 50));
        int[] x = {(int) (0.5 * w - 0.055 * h), (int) (0.5 * w - 0.045 * h), (int) (0.5 * w + 0.045 * h), (int) (0.5 * w + 0.055 * h)};
        int[] y = {(int) (0.95 * h), (int) (0.9 * h), (int) (0.9 * h), (int) (0.95 * h)};
        g.fill(new Polygon(x, y, 4));
        g.dispose();
        Picture out = new Picture(w, h);
        for (int py = 0; py < h; py++) {
            for (int px = 0; px < w; px++) {
                int rgb = image.getRGB(px, py);
                for (int c = 0; c < 3; c++) {
                    out.rgba()[4 * (px + w * py) + c] = (float) Srgb.decode((rgb >> (16 - 8 * c) & 255) / 255.0);
                }
                out.rgba()[4 * (px + w * py) + 3] = 1;
            }
        }
        return out;
    }
}
