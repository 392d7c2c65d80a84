package org.wispwright.ui.window.takes;

import java.awt.BasicStroke;
import java.awt.Dimension;
import java.awt.FontMetrics;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.util.List;
import java.util.Locale;
import javax.swing.JPanel;
import org.wispwright.ui.desk.SolveNow.Point;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** Loss over time while a solve runs: time to the right, the loss upwards on a logarithmic scale from 1, the original's. */
final class LossCurve extends JPanel {
    private static final double[] RULED = {1, 0.3, 0.1, 0.03, 0.01, 0.003, 0.001};
    private static final double LEAST_SPAN = 0.3;

    private List<Point> points = List.of();

    LossCurve() {
        setName("loss-curve");
        setFont(Palette.small());
        setOpaque(false);
        getAccessibleContext().setAccessibleName(Words.of("takes.curve"));
    }

    /** Shows a curve. */
    void show(List<Point> curve) {
        if (points.equals(curve)) {
            return;
        }
        points = curve;
        String words = curve.isEmpty() ? Words.of("takes.curve") : Words.of("takes.curve.now", number(last().loss()),
                Amounts.duration(last().seconds()));
        getAccessibleContext().setAccessibleDescription(words);
        setToolTipText(words + " " + Words.of("takes.curve.tip"));
        repaint();
    }

    private Point last() {
        return points.get(points.size() - 1);
    }

    private static String number(double loss) {
        return String.format(Locale.ROOT, loss >= 0.1 ? "%.2f" : "%.3f", loss);
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(160, 8 * getFontMetrics(getFont()).getHeight());
    }

    @Override
    public Dimension getMinimumSize() {
        return new Dimension(80, getPreferredSize().height);
    }

    @Override
    protected void paintComponent(Graphics g) {
        Graphics2D on = (Graphics2D) g.create();
        on.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        on.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        FontMetrics font = on.getFontMetrics();
        int left = font.stringWidth("0.003") + Palette.STEP;
        int top = font.getHeight() + Palette.STEP;
        int right = getWidth() - Palette.STEP;
        int bottom = getHeight() - font.getHeight() - Palette.STEP;
        double most = Math.max(1, points.stream().mapToDouble(Point::loss).max().orElse(1));
        double least = Math.min(LEAST_SPAN, points.stream().mapToDouble(Point::loss).min().orElse(1)) / 1.2;
        double range = Math.log(most / least);
        on.setColor(Palette.QUIET.colour());
        on.drawString(Words.of("takes.curve.loss"), 0, font.getAscent());
        String time = points.isEmpty() ? Words.of("takes.curve.time") : Words.of("takes.curve.until", Amounts.duration(last().seconds()));
        on.drawString(time, right - font.stringWidth(time), getHeight() - font.getDescent());
        for (double loss : RULED) {
            if (loss <= most && loss >= least) {
                int y = (int) Math.round(top + Math.log(most / loss) / range * (bottom - top));
                on.setColor(Palette.LINE.colour());
                on.drawLine(left, y, right, y);
                on.setColor(Palette.QUIET.colour());
                String words = loss == 1 ? "1" : String.valueOf(loss);
                on.drawString(words, left - Palette.STEP - font.stringWidth(words), y + font.getAscent() / 2 - 1);
            }
        }
        if (!points.isEmpty()) {
            curve(on, left, right - Palette.STEP, top, bottom, most, range);
        }
        on.dispose();
    }

    private void curve(Graphics2D on, int left, int right, int top, int bottom, double most, double range) {
        double span = Math.max(1e-9, last().seconds());
        Path2D line = new Path2D.Double();
        line.moveTo(left, top + Math.log(most) / range * (bottom - top));       // at 0 s the loss is the original's, 1
        double x = left;
        double y = top;
        for (Point p : points) {
            x = left + p.seconds() / span * (right - left);
            y = top + Math.log(most / Math.max(1e-12, p.loss())) / range * (bottom - top);
            line.lineTo(x, y);
        }
        on.setColor(Palette.ACCENT.colour());
        on.setStroke(new BasicStroke(1.5f));
        on.draw(line);
        on.fill(new Ellipse2D.Double(x - 3, y - 3, 6, 6));
        String now = number(last().loss());
        FontMetrics font = on.getFontMetrics();
        on.setColor(Palette.TEXT.colour());
        on.drawString(now, (int) (x - font.stringWidth(now)), (int) Math.max(top - 2, y - 2 * Palette.STEP));
    }
}
