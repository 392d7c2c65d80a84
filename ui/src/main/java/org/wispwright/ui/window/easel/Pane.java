package org.wispwright.ui.window.easel;

import java.awt.Graphics2D;
import java.awt.Rectangle;
import java.awt.geom.AffineTransform;
import java.awt.image.BufferedImage;
import java.awt.image.DataBufferInt;
import org.wispwright.warp.matte.Window;

/**
 * A plate as it lies on the screen, kept in the screen's own pixels, so that drawing again, or only a part, is a copy. Made anew where the
 * plate, the placement, the size or the surround changed.
 */
final class Pane {
    private BufferedImage image;
    private int[] pixels;
    private Plate plate;
    private Placement placement;
    private int around;

    /**
     * Brings the pane up to date.
     *
     * @param shown    the plate; null for nothing
     * @param lies     where, in the screen's pixels
     * @param width    of the screen's part
     * @param height   of it
     * @param surround 0xRRGGBB
     */
    void show(Plate shown, Placement lies, int width, int height, int surround) {
        boolean same = image != null && image.getWidth() == width && image.getHeight() == height;
        if (same && plate == shown && lies.equals(placement) && around == surround) {
            return;
        }
        if (!same) {
            image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
            pixels = ((DataBufferInt) image.getRaster().getDataBuffer()).getData();
        }
        plate = shown;
        placement = lies;
        around = surround;
        draw(new Rectangle(0, 0, width, height));
    }

    /** Pixels of the plate changed. @return the part of the screen that changed with them, perhaps empty */
    Rectangle changed(Window window) {
        if (plate == null || image == null) {
            return new Rectangle();
        }
        double zoom = placement.scale() / plate.height();
        int x0 = (int) Math.floor(placement.left() + (window.left() - 2) * zoom);
        int y0 = (int) Math.floor(placement.top() + (window.top() - 2) * zoom);
        int x1 = (int) Math.ceil(placement.left() + (window.left() + window.width() + 2) * zoom);
        int y1 = (int) Math.ceil(placement.top() + (window.top() + window.height() + 2) * zoom);
        Rectangle part = new Rectangle(x0, y0, x1 - x0, y1 - y0).intersection(new Rectangle(0, 0, image.getWidth(), image.getHeight()));
        if (!part.isEmpty()) {
            draw(part);
        }
        return part;
    }

    private void draw(Rectangle part) {
        if (plate == null) {
            for (int y = part.y; y < part.y + part.height; y++) {
                int at = image.getWidth() * y + part.x;
                java.util.Arrays.fill(pixels, at, at + part.width, around);
            }
            return;
        }
        Plate fitting = plate.fitting(placement.scale());
        ScaleKernel.draw(fitting.codes(), fitting.width(), fitting.height(), placement.left(), placement.top(),
                placement.scale() / fitting.height(), pixels, image.getWidth(), part.x, part.y, part.x + part.width, part.y + part.height,
                around);
    }

    /** Copies it to where its corner belongs, in the screen's pixels; the clip decides how much. @param toScreen from those to the graphics */
    void paint(Graphics2D g, AffineTransform toScreen) {
        if (image != null) {
            g.drawImage(image, toScreen, null);
        }
    }
}
