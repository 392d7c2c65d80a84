package org.wispwright.ui.report;

import java.awt.Color;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.Shape;
import java.awt.geom.AffineTransform;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;

/**
 * One picture that a person understands at a glance: a row for each note with the retouch, original, wanted, got, and what
 * is still apart, the note's words above them and how far it is met at the right.
 * <p>The difference's gain is the same in the whole sheet and is set by the wish, not by what is left of it: the largest
 * power of two at which |wanted - original| does not clip. So a note that is met looks black.
 *
 * @param title what the sheet is about, such as the shot's name
 * @param subtitle which takes it compares
 * @param before what the pictures before are called, such as "original"
 * @param background linear light behind the smoke
 * @param rows one for each note, at least one
 */
public record Sheet(String title, String subtitle, String before, Rgb background, List<SheetRow> rows) {
    private static final int MARGIN = 48;
    private static final int GAP = 20;
    private static final int HEAD = 104;
    private static final int ROW_HEAD = 70;
    private static final int LABEL = 34;
    private static final int ROW_GAP = 40;
    private static final int FRAME_WIDTH = 420;
    private static final int FRAME_HEIGHT = 400;
    private static final double MOST_GAIN = 64;

    private static final Color SURROUND = new Color(0x3C3C3C);
    private static final Color RULE = new Color(0x555555);
    private static final Color TEXT = new Color(0xECECEC);
    private static final Color QUIET = new Color(0xB4B4B4);
    private static final Color BAR_REST = new Color(0x565656);
    private static final Color BAR = new Color(0x9BD18B);

    private record Cell(BufferedImage image, String label, boolean marked) {
    }

    /** Checks that there is something to show. @throws IllegalArgumentException if there is no row */
    public Sheet {
        rows = List.copyOf(rows);
        if (rows.isEmpty()) {
            throw new IllegalArgumentException("sheet: needs at least one note to show");
        }
    }

    /** What the differences are multiplied by: a power of two of 1 to 64. */
    public double gain() {
        double largest = 1.0 / MOST_GAIN;
        for (SheetRow row : rows) {
            largest = Math.max(largest, ShownPicture.largestDifference(row.wanted(), row.original(), background));
        }
        double gain = 1;
        while (2 * gain * largest <= 1 && gain < MOST_GAIN) {
            gain *= 2;
        }
        return gain;
    }

    /** The two pictures' difference at its own raster, with the sheet's gain: black where they agree. */
    public BufferedImage difference(Picture got, Picture wanted) {
        return ShownPicture.difference(got, wanted, background, gain());
    }

    /** Paints the sheet, 8-bit sRGB. Needs no display. */
    public BufferedImage paint() {
        int columns = rows.stream().anyMatch(r -> r.rendered().isPresent()) ? 5 : 4;
        int cellWidth = 1;
        int cellHeight = 1;
        for (SheetRow row : rows) {
            cellWidth = Math.max(cellWidth, shownWidth(row.original()));
            cellHeight = Math.max(cellHeight, shownHeight(row.original()));
        }
        int width = 2 * MARGIN + columns * cellWidth + (columns - 1) * GAP;
        int rowHeight = ROW_HEAD + cellHeight + LABEL + ROW_GAP;
        BufferedImage sheet = new BufferedImage(width, HEAD + rows.size() * rowHeight + MARGIN - ROW_GAP, BufferedImage.TYPE_INT_RGB);
        Graphics2D g = sheet.createGraphics();
        try {
            g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
            g.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
            g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
            g.setColor(SURROUND);
            g.fillRect(0, 0, sheet.getWidth(), sheet.getHeight());
            Lettering.line(g, title, width - 2 * MARGIN, MARGIN, 58, Lettering.font(Font.BOLD, 26), TEXT);
            Lettering.line(g, subtitle, width - 2 * MARGIN - 540, MARGIN, 84, Lettering.font(Font.PLAIN, 15), QUIET);
            paintLegend(g, width - MARGIN, meanings());
            double gain = gain();
            for (int n = 0; n < rows.size(); n++) {
                paintRow(g, rows.get(n), HEAD + n * rowHeight, cellWidth, cellHeight, width, columns, gain);
            }
        } finally {
            g.dispose();
        }
        return sheet;
    }

    private void paintRow(Graphics2D g, SheetRow row, int top, int cellWidth, int cellHeight, int width, int columns, double gain) {
        g.setColor(RULE);
        g.fillRect(MARGIN, top, width - 2 * MARGIN, 1);
        int metWidth = paintMet(g, row.met(), width - MARGIN, top);
        Font wordsFont = Lettering.font(Font.PLAIN, 18);
        Lettering.line(g, "\u201C" + row.words().replaceAll("\\s+", " ").strip() + "\u201D", width - 2 * MARGIN - metWidth - 24,
                MARGIN, top + 32, wordsFont, TEXT);
        Lettering.text(g, row.id() + "  \u00B7  " + row.place(), MARGIN, top + 54, Lettering.font(Font.PLAIN, 14), QUIET);
        List<Cell> cells = cells(row, gain, columns);
        int y = top + ROW_HEAD;
        for (int n = 0; n < cells.size(); n++) {
            int x = MARGIN + n * (cellWidth + GAP);
            paintCell(g, cells.get(n), row, x, y, cellWidth, cellHeight);
        }
    }

    private List<Cell> cells(SheetRow row, double gain, int columns) {
        List<Cell> cells = new ArrayList<>();
        boolean foreign = row.rendered().isPresent();
        if (columns == 5) {
            cells.add(foreign ? cell(row.rendered().get(), "rendered frame, with the note", true)
                    : new Cell(null, "no rendered frame", false));
        }
        cells.add(cell(row.original(), foreign ? before : before + ", with the note", !foreign));
        cells.add(cell(row.wanted(), "wanted", false));
        cells.add(cell(row.got(), "got", false));
        BufferedImage apart = ShownPicture.difference(row.got(), row.wanted(), background, gain);
        String stated = String.format(Locale.ROOT, "got \u2212 wanted, difference \u00D7%.0f", gain);
        cells.add(new Cell(ShownPicture.scaled(apart, shownWidth(row.got()), shownHeight(row.got())), stated, false));
        return cells;
    }

    private Cell cell(Picture picture, String label, boolean marked) {
        return new Cell(ShownPicture.scaled(ShownPicture.over(picture, background), shownWidth(picture), shownHeight(picture)), label,
                marked);
    }

    private static void paintCell(Graphics2D g, Cell cell, SheetRow row, int x, int y, int cellWidth, int cellHeight) {
        if (cell.image() == null) {
            g.setColor(RULE);
            g.drawRect(x, y, cellWidth - 1, cellHeight - 1);
        } else {
            g.drawImage(cell.image(), x, y, null);
            if (cell.marked()) {
                AffineTransform before = g.getTransform();
                Shape clip = g.getClip();
                g.clipRect(x, y, cell.image().getWidth(), cell.image().getHeight());
                g.translate(x, y);
                new RetouchMarks(g, cell.image().getHeight(), row.original()).draw(row.retouch(), row.holds(), row.weighBy(), row.folds());
                g.setTransform(before);
                g.setClip(clip);
            }
        }
        Lettering.text(g, cell.label(), x, y + cellHeight + 22, Lettering.font(Font.PLAIN, 14), QUIET);
    }

    private Set<RetouchMarks.Meaning> meanings() {
        Set<RetouchMarks.Meaning> all = EnumSet.noneOf(RetouchMarks.Meaning.class);
        rows.forEach(row -> all.addAll(RetouchMarks.meanings(row.retouch(), row.holds(), row.weighBy(), row.folds())));
        return all;
    }

    /** What the marks' colours mean, ending at {@code right}. */
    private static void paintLegend(Graphics2D g, int right, Set<RetouchMarks.Meaning> meanings) {
        Font font = Lettering.font(Font.PLAIN, 14);
        int x = right;
        for (RetouchMarks.Meaning meaning : meanings) {
            x -= Lettering.width(g, meaning.words(), font);
            Lettering.text(g, meaning.words(), x, 84, font, QUIET);
            x -= 24;
            g.setColor(meaning.colour());
            g.fillRoundRect(x, 77, 16, 4, 4, 4);
            x -= 22;
        }
    }

    /** Draws how far the note is met, ending at {@code right}; gives the width it took. */
    private static int paintMet(Graphics2D g, double met, int right, int top) {
        Font big = Lettering.font(Font.BOLD, 22);
        String words = metInWords(met);
        int textWidth = Lettering.width(g, words, big);
        int barWidth = 150;
        Lettering.text(g, words, right - textWidth, top + 33, big, TEXT);
        g.setColor(BAR_REST);
        g.fillRoundRect(right - barWidth, top + 45, barWidth, 6, 6, 6);
        int filled = (int) Math.round(barWidth * Math.min(1, Math.max(0, met)));
        if (filled > 0) {
            g.setColor(BAR);
            g.fillRoundRect(right - barWidth, top + 45, Math.max(6, filled), 6, 6, 6);
        }
        return Math.max(barWidth, textWidth);
    }

    /** "met 97 %": whole percent, rounded down so that 100 % means all of it. */
    static String metInWords(double met) {
        int percent = (int) Math.floor(100 * Math.min(1, Math.max(-9.99, met)) + 1e-9);
        return "met " + (percent < 0 ? "\u2212" : "") + Math.abs(percent) + " %";
    }

    private static double scale(Picture picture) {
        return Math.min((double) FRAME_WIDTH / picture.width(), (double) FRAME_HEIGHT / picture.height());
    }

    private static int shownWidth(Picture picture) {
        return Math.max(1, (int) Math.round(picture.width() * scale(picture)));
    }

    private static int shownHeight(Picture picture) {
        return Math.max(1, (int) Math.round(picture.height() * scale(picture)));
    }
}
