package org.wispwright.ui.window.takes;

import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.image.BufferedImage;
import javax.swing.JPanel;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.ui.report.ShownPicture;
import org.wispwright.ui.window.Palette;

/** The small picture that a running solve has of a note's frame. */
final class GotPicture extends JPanel {
    private static final int LINES = 8;

    private Picture picture;
    private BufferedImage image;

    GotPicture() {
        setName("solve-got");
        setFont(Palette.small());
        setOpaque(false);
    }

    /** Shows a picture over a background. */
    void show(String words, Picture got, Rgb background) {
        getAccessibleContext().setAccessibleName(words);
        setToolTipText(words);
        if (got != picture) {
            picture = got;
            image = ShownPicture.over(got, background);                        // about a pixel a cell: some thousands
            revalidate();
            repaint();
        }
    }

    @Override
    public Dimension getPreferredSize() {
        int rows = LINES * getFontMetrics(getFont()).getHeight();
        return new Dimension(image == null ? rows : Math.max(1, rows * image.getWidth() / image.getHeight()), rows);
    }

    @Override
    public Dimension getMinimumSize() {
        return new Dimension(40, 40);
    }

    @Override
    protected void paintComponent(Graphics g) {
        if (image == null) {
            return;
        }
        Graphics2D on = (Graphics2D) g.create();
        on.setRenderingHint(RenderingHints.KEY_INTERPOLATION, RenderingHints.VALUE_INTERPOLATION_BILINEAR);
        double scale = Math.min((double) getWidth() / image.getWidth(), (double) getHeight() / image.getHeight());
        int width = (int) Math.round(scale * image.getWidth());
        int height = (int) Math.round(scale * image.getHeight());
        on.drawImage(image, (getWidth() - width) / 2, 0, width, height, null);
        on.dispose();
    }
}
