package org.wispwright.ui.sample;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.GradientPaint;
import java.awt.Graphics2D;
import java.awt.RadialGradientPaint;
import java.awt.RenderingHints;
import java.awt.TexturePaint;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Point2D;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.Optional;
import java.util.Random;
import javax.imageio.ImageIO;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.solve.Simulation;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.Light;
import org.wispwright.render.march.Look;
import org.wispwright.render.march.RayMarcher;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.picture.Srgb;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;

/**
 * Makes the roof vent's rendered frame and the same frame as a person painted over it: thicker, bluer smoke at dusk over a roof, 8 bits,
 * grain; then, in the picture's own coded colours and knowing nothing of smoke, soft dabs that bring back the clean sky and soft dabs of a
 * colour picked up from the smoke.
 * <p>Run: {@code java -cp <test class path> org.wispwright.ui.sample.PaintRoofVentFrames samples/roof-vent samples/roof-vent/frames}.
 */
public final class PaintRoofVentFrames {
    private static final int FRAME = 1030;
    private static final Raster RASTER = new Raster(480, 720);
    private static final Look LOOK = new Look(4.4, new Rgb(0.9, 0.93, 0.97), new Rgb(0.3, 0.36, 0.5),
            Optional.of(new Light(new Vec3(-0.8, 0.7, 0.5), new Rgb(0.8, 0.75, 0.8))));

    private PaintRoofVentFrames() { }

    /** See above. */
    public static void main(String[] args) throws IOException {
        Shot shot = ShotCheck.require(Path.of(args[0]), 2L << 30);
        Path out = Path.of(args[1]);
        View view = shot.view("street").orElseThrow().view().withRaster(RASTER);
        BufferedImage sky = sky();
        try (Lanes lanes = new Lanes(2)) {
            RayMarcher marcher = new RayMarcher(shot.flow().grid(), view, shot.flow().grid().cellMetres() / 4, lanes);
            Simulation.run(new SmokeSolver(shot.flow(), lanes), shot.flow().startState(), null, null, FRAME, () -> false,
                    (frame, state, force) -> {
                if (frame == FRAME) {
                    Picture smoke = RASTER.picture();
                    marcher.picture(state.density(), LOOK, smoke);
                    BufferedImage before = over(smoke, sky);
                    write(before, out.resolve("street." + FRAME + ".png"));
                    write(painted(before, sky), out.resolve("street." + FRAME + ".painted.png"));
                }
            });
        }
    }

    /** What was painted; positions are fractions of the height. */
    private static BufferedImage painted(BufferedImage before, BufferedImage sky) {
        BufferedImage image = new BufferedImage(before.getWidth(), before.getHeight(), BufferedImage.TYPE_INT_RGB);
        Graphics2D g = image.createGraphics();
        g.drawImage(before, 0, 0, null);
        // The left lobe is opened: the clean sky, through a soft brush.
        for (double[] dab : new double[][] {{0.215, 0.41, 0.08}, {0.19, 0.395, 0.07}, {0.24, 0.425, 0.06}}) {
            g.drawImage(softly(sky, dab[0], dab[1], dab[2], 0.75), 0, 0, null);
        }
        // A wisp to the upper right, in the colour of the head's edge.
        int colour = before.getRGB((int) (0.40 * 720), (int) (0.25 * 720));
        BufferedImage flat = new BufferedImage(before.getWidth(), before.getHeight(), BufferedImage.TYPE_INT_RGB);
        Graphics2D f = flat.createGraphics();
        f.setColor(new Color(colour));
        f.fillRect(0, 0, flat.getWidth(), flat.getHeight());
        f.dispose();
        for (double[] dab : new double[][] {{0.43, 0.28, 0.075}, {0.455, 0.25, 0.07}, {0.475, 0.22, 0.06}, {0.49, 0.19, 0.05}}) {
            g.drawImage(softly(flat, dab[0], dab[1], dab[2], 0.5), 0, 0, null);
        }
        g.dispose();
        return image;
    }

    /** A picture seen through one soft dab. */
    private static BufferedImage softly(BufferedImage source, double x, double y, double radius, double strength) {
        int h = source.getHeight();
        BufferedImage dab = new BufferedImage(source.getWidth(), h, BufferedImage.TYPE_INT_ARGB);
        Graphics2D g = dab.createGraphics();
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setPaint(new RadialGradientPaint(new Point2D.Double(x * h, y * h), (float) (radius * h), new float[] {0, 0.5f, 1},
                new Color[] {new Color(1f, 1f, 1f, (float) strength), new Color(1f, 1f, 1f, (float) (0.6 * strength)),
                    new Color(1f, 1f, 1f, 0f)}));
        g.fill(new Ellipse2D.Double((x - radius) * h, (y - radius) * h, 2 * radius * h, 2 * radius * h));
        g.setComposite(java.awt.AlphaComposite.SrcIn);
        g.setPaint(new TexturePaint(source, new Rectangle2D.Double(0, 0, source.getWidth(), h)));
        g.fillRect(0, 0, source.getWidth(), h);
        g.dispose();
        return dab;
    }

    private static BufferedImage over(Picture smoke, BufferedImage sky) {
        BufferedImage out = new BufferedImage(smoke.width(), smoke.height(), BufferedImage.TYPE_INT_RGB);
        Random grain = new Random(FRAME);
        for (int p = 0; p < smoke.width() * smoke.height(); p++) {
            int behind = sky.getRGB(p % smoke.width(), p / smoke.width());
            double noise = 1 + 0.01 * grain.nextGaussian();
            int rgb = 0;
            for (int c = 0; c < 3; c++) {
                double light = smoke.rgba()[4 * p + c] + (1 - smoke.rgba()[4 * p + 3])
                        * Srgb.decode((behind >> (16 - 8 * c) & 255) / 255.0);
                rgb = rgb << 8 | (int) Math.round(255 * Srgb.encode(Math.min(1, Math.max(0, light * noise))));
            }
            out.setRGB(p % smoke.width(), p / smoke.width(), rgb);
        }
        return out;
    }

    /** Dusk over a flat roof with a vent. */
    private static BufferedImage sky() {
        int w = RASTER.width();
        int h = RASTER.height();
        BufferedImage image = new BufferedImage(w, h, BufferedImage.TYPE_INT_RGB);
        Graphics2D g = image.createGraphics();
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setPaint(new GradientPaint(0, 0, new Color(30, 36, 62), 0, 0.95f * h, new Color(112, 92, 104)));
        g.fillRect(0, 0, w, h);
        g.setColor(new Color(28, 28, 34));
        g.fillRect(0, (int) (0.965 * h), w, h);
        g.setStroke(new BasicStroke(1.5f));
        g.fillRect(w / 2 - (int) (0.06 * h), (int) (0.935 * h), (int) (0.12 * h), (int) (0.04 * h));
        g.dispose();
        return image;
    }

    private static void write(BufferedImage image, Path file) {
        try {
            ImageIO.write(image, "png", file.toFile());
        } catch (IOException refused) {
            throw new UncheckedIOException(refused);
        }
    }
}
