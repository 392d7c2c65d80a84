package org.wispwright.ui.window.notes;

import java.awt.Dimension;
import java.awt.FontMetrics;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.event.ComponentAdapter;
import java.awt.event.ComponentEvent;
import java.awt.image.BufferedImage;
import java.util.List;
import java.util.Optional;
import org.wispwright.ui.desk.Thumbnail;
import org.wispwright.ui.window.DrawnPart;
import org.wispwright.ui.window.Palette;

/** Small pictures side by side with a word below each; a plain field where there is none yet. */
final class ThumbnailRow extends DrawnPart {
    private static final int CELL = 68;
    private static final int TALLEST = 92;
    private static final int GAP = 4;
    private static final String ELLIPSIS = "\u2026";

    private final List<String> words;
    private final Thumbnail[] shown;
    private final BufferedImage[] images;
    private double aspect = 1;

    /** @param words below the pictures, one each */
    ThumbnailRow(List<String> words) {
        this.words = words;
        shown = new Thumbnail[words.size()];
        images = new BufferedImage[words.size()];
        addComponentListener(new ComponentAdapter() {
            @Override
            public void componentResized(ComponentEvent e) {
                revalidate();                                                  // its height goes with its width
            }
        });
    }

    /** @param widthByHeight of the pictures */
    void shape(double widthByHeight) {
        if (aspect != widthByHeight) {
            aspect = widthByHeight;
            revalidate();
        }
    }

    /** Another picture, or none yet. */
    void show(int place, Optional<Thumbnail> picture) {
        Thumbnail next = picture.orElse(null);
        if (shown[place] != next) {
            shown[place] = next;
            images[place] = picture.map(ThumbnailRow::image).orElse(null);
            repaint();
        }
    }

    /** True if a picture is there. */
    boolean has(int place) {
        return shown[place] != null;
    }

    private static BufferedImage image(Thumbnail t) {
        BufferedImage image = new BufferedImage(t.width(), t.height(), BufferedImage.TYPE_INT_RGB);
        image.setRGB(0, 0, t.width(), t.height(), t.rgb(), 0, t.width());
        return image;
    }

    private int cell() {
        return (getWidth() + GAP) / words.size() - GAP;
    }

    private int pictureHeight() {
        double wide = getWidth() > 0 ? Math.min(CELL, cell()) : CELL;
        return (int) Math.max(24, Math.min(TALLEST, wide / aspect));
    }

    @Override
    public Dimension getPreferredSize() {
        FontMetrics metrics = getFontMetrics(Palette.small());
        return new Dimension(words.size() * (CELL + GAP) - GAP, pictureHeight() + metrics.getHeight() + GAP / 2);
    }

    @Override
    public Dimension getMinimumSize() {
        return new Dimension(60, getPreferredSize().height);
    }

    @Override
    protected void paintComponent(Graphics g) {
        Graphics2D g2 = (Graphics2D) g.create();
        g2.setRenderingHint(RenderingHints.KEY_INTERPOLATION, RenderingHints.VALUE_INTERPOLATION_BILINEAR);
        g2.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        g2.setFont(Palette.small());
        FontMetrics metrics = g2.getFontMetrics();
        int cell = cell();
        int height = pictureHeight();
        int width = (int) Math.min(cell, Math.round(height * aspect));
        int tall = (int) Math.min(height, Math.round(width / aspect));
        for (int n = 0; n < words.size(); n++) {
            int left = n * (cell + GAP) + (cell - width) / 2;
            if (images[n] != null) {
                g2.drawImage(images[n], left, 0, width, tall, null);
            } else {
                g2.setColor(Palette.SURROUND.colour());
                g2.fillRect(left, 0, width, tall);
                g2.setColor(Palette.LINE.colour());
                g2.drawRect(left, 0, width - 1, tall - 1);
            }
            g2.setColor(Palette.QUIET.colour());
            String word = fitting(words.get(n), metrics, cell);
            g2.drawString(word, n * (cell + GAP) + (cell - metrics.stringWidth(word)) / 2, tall + GAP / 2 + metrics.getAscent());
        }
        g2.dispose();
    }

    private static String fitting(String word, FontMetrics metrics, int width) {
        if (metrics.stringWidth(word) <= width) {
            return word;
        }
        String fits = word;
        while (fits.length() > 1 && metrics.stringWidth(fits + ELLIPSIS) > width) {
            fits = fits.substring(0, fits.length() - 1);
        }
        return fits + ELLIPSIS;
    }
}
