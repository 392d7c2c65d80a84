package org.wispwright.ui.window;

import java.awt.image.BufferedImage;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import javax.imageio.ImageIO;

/**
 * Pictures of the window that the documents show, held to be true. Fonts differ between machines, and times that are foretold between runs, so
 * a picture passes while few of its pixels differ much; {@code -Dgolden=write} takes new ones.
 */
final class Golden {
    /** A channel that differs by more counts as another. */
    private static final int MUCH = 48;
    /** The largest share of pixels that may. */
    private static final double MOST = 0.08;
    private static final Path DOCS = Path.of("..", "docs", "pictures");

    private Golden() {
    }

    /** Compares with {@code docs/pictures/NAME.png}. @throws AssertionError with the command to accept, and the picture in target/golden */
    static void check(String name, BufferedImage got) {
        Path accepted = DOCS.resolve(name + ".png");
        try {
            if ("write".equals(System.getProperty("golden"))) {
                ImageIO.write(got, "png", accepted.toFile());
                return;
            }
            BufferedImage wanted = ImageIO.read(accepted.toFile());
            double share = wanted.getWidth() != got.getWidth() || wanted.getHeight() != got.getHeight() ? 1 : differing(wanted, got);
            if (share > MOST) {
                Path kept = Files.createDirectories(Path.of("target", "golden")).resolve(name + ".png");
                ImageIO.write(got, "png", kept.toFile());
                throw new AssertionError(String.format("%s: %.1f %% of the pixels differ much from %s; got is in %s; accept with -Dgolden=write",
                        name, 100 * share, accepted, kept));
            }
        } catch (IOException unreadable) {
            throw new UncheckedIOException(unreadable);
        }
    }

    private static double differing(BufferedImage a, BufferedImage b) {
        int count = 0;
        for (int y = 0; y < a.getHeight(); y++) {
            for (int x = 0; x < a.getWidth(); x++) {
                int p = a.getRGB(x, y);
                int q = b.getRGB(x, y);
                boolean much = false;
                for (int shift = 0; shift <= 16; shift += 8) {
                    much |= Math.abs((p >> shift & 255) - (q >> shift & 255)) > MUCH;
                }
                count += much ? 1 : 0;
            }
        }
        return (double) count / (a.getWidth() * a.getHeight());
    }
}
