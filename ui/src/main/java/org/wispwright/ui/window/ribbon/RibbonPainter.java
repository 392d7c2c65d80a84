package org.wispwright.ui.window.ribbon;

import java.awt.BasicStroke;
import java.awt.FontMetrics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.awt.image.BufferedImage;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.WeakHashMap;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.MetWatch;
import org.wispwright.ui.desk.OpenShot;
import org.wispwright.ui.desk.Pictures.Ask;
import org.wispwright.ui.desk.Places;
import org.wispwright.ui.desk.RangeScale;
import org.wispwright.ui.desk.Spans;
import org.wispwright.ui.desk.Thumbnail;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** Draws the ribbon. */
final class RibbonPainter {
    /** A plot of less change than this would show noise. */
    private static final double LEAST_TOP = 0.01;
    private static final double[] NUMBER_STEPS = {1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000, 5000};

    private final Map<Thumbnail, BufferedImage> images = new WeakHashMap<>();

    /** @param cells the small pictures, side by side over the whole width */
    void paint(Graphics2D g, Desk desk, DeskState state, RangeScale scale, RibbonRows rows, List<Ask> cells) {
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_INTERPOLATION, RenderingHints.VALUE_INTERPOLATION_BILINEAR);
        g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        g.setFont(Palette.small());
        OpenShot shot = state.shot().orElseThrow();
        pictures(g, desk, shot, scale, rows, cells);
        holds(g, shot, scale, rows);
        plot(g, desk, state, scale, rows);
        int frame = state.showing().orElseThrow().frame();
        numbers(g, scale, frame);
        current(g, scale, rows, frame);
        pins(g, state, scale, rows);
    }

    private void pictures(Graphics2D g, Desk desk, OpenShot shot, RangeScale scale, RibbonRows rows, List<Ask> cells) {
        g.setColor(Palette.SURROUND.colour());
        g.fillRect(0, rows.pictures(), (int) scale.width(), rows.picture());
        for (int n = 0; n < cells.size(); n++) {
            Optional<Thumbnail> there = desk.thumbnails().get(shot, cells.get(n));
            if (there.isPresent()) {
                double cell = scale.width() / cells.size();
                int wide = (int) Math.round(Math.min(cell, (double) rows.picture() * there.get().width() / there.get().height()));
                int tall = (int) Math.round((double) wide * there.get().height() / there.get().width());
                g.drawImage(images.computeIfAbsent(there.get(), RibbonPainter::image), (int) Math.round(n * cell + (cell - wide) / 2),
                        rows.pictures() + (rows.picture() - tall) / 2, wide, tall, null);
            }
        }
    }

    private static BufferedImage image(Thumbnail t) {
        BufferedImage image = new BufferedImage(t.width(), t.height(), BufferedImage.TYPE_INT_RGB);
        image.setRGB(0, 0, t.width(), t.height(), t.rgb(), 0, t.width());
        return image;
    }

    /** Bars with ends, so that they are not told by their colour alone. */
    private static void holds(Graphics2D g, OpenShot shot, RangeScale scale, RibbonRows rows) {
        g.setColor(Palette.HELD.colour());
        for (Spans.Held span : Spans.of(shot)) {
            int left = (int) Math.round(scale.left(span.first()));
            int right = (int) Math.round(scale.left(span.last() + 1)) - 1;
            int middle = rows.holds() + rows.hold() / 2;
            g.fillRect(left, middle - 1, Math.max(2, right - left), 2);
            g.fillRect(left, rows.holds() + 1, 2, rows.hold() - 2);
            g.fillRect(Math.max(left, right - 2), rows.holds() + 1, 2, rows.hold() - 2);
        }
    }

    private static void plot(Graphics2D g, Desk desk, DeskState state, RangeScale scale, RibbonRows rows) {
        int bottom = rows.end() - 2;
        g.setColor(Palette.LINE.colour());
        g.fillRect(0, bottom, (int) scale.width(), 1);
        OptionalInt take = Places.judged(state);
        if (take.isEmpty()) {
            return;
        }
        OpenShot shot = state.shot().orElseThrow();
        FrameRange range = scale.range();
        String view = state.showing().orElseThrow().view();
        double top = LEAST_TOP;
        for (int frame = range.first(); frame <= range.last(); frame++) {
            top = Math.max(top, desk.change().of(shot, take.getAsInt(), view, frame).orElse(0.0));
        }
        Path2D line = new Path2D.Double();
        double tall = bottom - rows.plot() - 3;
        for (int frame = range.first(); frame <= range.last(); frame++) {
            Optional<Double> share = desk.change().of(shot, take.getAsInt(), view, frame);
            if (share.isPresent()) {
                double y = bottom - tall * share.get() / top;
                if (line.getCurrentPoint() == null) {
                    line.moveTo(scale.middle(frame), y);
                } else {
                    line.lineTo(scale.middle(frame), y);
                }
            }
        }
        g.setColor(Palette.CHANGE.colour());
        g.setStroke(new BasicStroke(1.5f));
        g.draw(line);
        if (line.getCurrentPoint() != null) {
            g.drawString(Words.of("ribbon.change", String.format(Locale.ROOT, "%.0f", 100 * top)), 4,
                    rows.plot() + g.getFontMetrics().getAscent());
        }
        met(g, desk, state, scale, rows, take.getAsInt());
    }

    private static void met(Graphics2D g, Desk desk, DeskState state, RangeScale scale, RibbonRows rows, int take) {
        OpenShot shot = state.shot().orElseThrow();
        FontMetrics metrics = g.getFontMetrics();
        g.setColor(Palette.MET.colour());
        int bottom = rows.end() - 2;
        double tall = bottom - rows.plot() - 6;
        for (Listed listed : shot.notes()) {
            Optional<MetWatch.Met> found = desk.met().of(shot, listed.note(), take);
            if (listed.on() && found.isPresent() && found.get().share().isPresent()) {
                double met = found.get().share().getAsDouble();
                double x = scale.middle(listed.note().frame());
                double y = bottom - 3 - tall * Math.max(0, Math.min(1, met));
                g.fill(new Ellipse2D.Double(x - 3, y - 3, 6, 6));
                String words = Words.of("ribbon.met", String.format(Locale.ROOT, "%.0f", 100 * met));
                int wide = metrics.stringWidth(words);
                int left = (int) (x + 6 + wide > scale.width() ? x - 6 - wide : x + 6);
                int base = (int) Math.max(rows.plot() + metrics.getAscent() - 2, Math.min(rows.end() - 3, y + metrics.getAscent() / 2.0));
                g.setColor(Palette.PANEL.colour());                            // the plot's line would cross the words
                g.fillRect(left - 1, base - metrics.getAscent() + 2, wide + 2, metrics.getAscent() - 1);
                g.setColor(Palette.MET.colour());
                g.drawString(words, left, base);
            }
        }
    }

    private static void numbers(Graphics2D g, RangeScale scale, int shown) {
        FontMetrics metrics = g.getFontMetrics();
        FrameRange range = scale.range();
        double least = metrics.stringWidth(String.valueOf(range.last())) + 12;
        int every = range.count();
        for (double step : NUMBER_STEPS) {
            if (step * scale.step() >= least) {
                every = (int) step;
                break;
            }
        }
        int wide = metrics.stringWidth(String.valueOf(shown));
        double marker = left(scale, shown, wide);
        g.setColor(Palette.QUIET.colour());
        for (int frame = range.first(); frame <= range.last(); frame++) {
            boolean number = frame == range.first() || frame % every == 0;
            double x = left(scale, frame, metrics.stringWidth(String.valueOf(frame)));
            boolean free = Math.abs(x - marker) > wide + 6 && (frame == range.first() || x > left(scale, range.first(), wide) + wide + 6);
            if (number && free) {
                g.drawString(String.valueOf(frame), (int) x, metrics.getAscent());
            }
        }
        g.setColor(Palette.ACCENT.colour());
        g.setFont(Palette.small().deriveFont(Palette.strong().getStyle()));
        g.drawString(String.valueOf(shown), (int) marker, metrics.getAscent());
        g.setFont(Palette.small());
    }

    private static double left(RangeScale scale, int frame, int wide) {
        return Math.max(2, Math.min(scale.width() - wide - 2, scale.middle(frame) - wide / 2.0));
    }

    private static void current(Graphics2D g, RangeScale scale, RibbonRows rows, int frame) {
        int x = (int) Math.round(scale.middle(frame));
        g.setColor(Palette.ACCENT.colour());
        g.fillRect(x - 1, rows.pins(), 2, rows.end() - rows.pins() - 1);
    }

    /** Diamonds: full if the note is on, hollow if it is off, ringed if it is open. */
    private static void pins(Graphics2D g, DeskState state, RangeScale scale, RibbonRows rows) {
        for (Listed listed : state.shot().orElseThrow().notes()) {
            double x = scale.middle(listed.note().frame());
            double y = rows.pins() + RibbonRows.PIN / 2.0;
            Path2D pin = diamond(x, y, 4);
            g.setStroke(new BasicStroke(1.5f));
            g.setColor(Palette.PANEL.colour());
            g.fill(diamond(x, y, 6));
            g.setColor(Palette.WANTED.colour());
            if (listed.on()) {
                g.fill(pin);
            }
            g.draw(pin);
            if (state.note().map(listed.note().id()::equals).orElse(false)) {
                g.setColor(Palette.ACCENT.colour());
                g.draw(diamond(x, y, 6.5));
            }
        }
    }

    private static Path2D diamond(double x, double y, double reach) {
        Path2D path = new Path2D.Double();
        path.moveTo(x, y - reach);
        path.lineTo(x + reach, y);
        path.lineTo(x, y + reach);
        path.lineTo(x - reach, y);
        path.closePath();
        return path;
    }
}
