package org.wispwright.ui.job;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.function.ToDoubleFunction;
import org.wispwright.warp.measure.Likeness;

/** A review's figures for programs (JSON, CSV) and for people (a table). What each means: docs/commands.md. */
public final class ReviewReport {
    private static final String GAP = "  ";

    /** One figure of a likeness: its name in files, its head and digits in the table. */
    private record Figure(String name, String head, String format, ToDoubleFunction<Likeness> value) {
    }

    private static final List<Figure> FIGURES = List.of(
            new Figure("structure", "structure", "%.3f", Likeness::structure),
            new Figure("peakSignalToNoise", "PSNR dB", "%.1f", Likeness::peakSignalToNoise),
            new Figure("meanAbsolute", "mean error", "%.4f", Likeness::meanAbsolute),
            new Figure("overlap", "overlap", "%.3f", Likeness::overlap),
            new Figure("farthest", "farthest", "%.3f", Likeness::farthest),
            new Figure("nearest", "nearest", "%.4f", Likeness::nearest),
            new Figure("across", "across", "%.4f", Likeness::across),
            new Figure("down", "down", "%.4f", Likeness::down));

    private ReviewReport() {
    }

    /**
     * Adds {@code silhouetteLevel}, {@code measures} and {@code continuity} to an object; null stands for what is infinite or has no value.
     */
    static ObjectNode add(Review review, ObjectNode top) {
        top.put("silhouetteLevel", Review.LEVEL);
        ArrayNode measures = top.putArray("measures");
        for (Review.OfRegion region : review.regions()) {
            ObjectNode entry = measures.addObject().put("note", region.note()).put("region", region.region());
            put(region.got(), entry.putObject("got"));
            put(region.original(), entry.putObject("original"));
        }
        ArrayNode continuity = top.putArray("continuity");
        for (Review.OfView view : review.views()) {
            ObjectNode entry = continuity.addObject().put("view", view.view());
            entry.putArray("raster").add(view.raster().width()).add(view.raster().height());
            ArrayNode frames = entry.putArray("frames");
            for (Review.OfFrame f : view.frames()) {
                frames.addObject().put("frame", f.frame()).put("before", f.before()).put("after", f.after()).put("added", f.added())
                        .put("fromOriginal", f.fromOriginal());
            }
        }
        return top;
    }

    private static void put(Likeness likeness, ObjectNode entry) {
        for (Figure figure : FIGURES) {
            double value = figure.value().applyAsDouble(likeness);
            if (Double.isFinite(value)) {
                entry.put(figure.name(), value);
            } else {
                entry.putNull(figure.name());
            }
        }
    }

    /** The measures as CSV (RFC 4180): a line a note, region and picture ({@code got} or {@code original}); {@code inf} where infinite. */
    static String csv(Review review) {
        StringBuilder text = new StringBuilder("note,region,picture");
        FIGURES.forEach(figure -> text.append(',').append(figure.name()));
        text.append("\r\n");
        for (Review.OfRegion region : review.regions()) {
            line(text, region, "got", region.got());
            line(text, region, "original", region.original());
        }
        return text.toString();
    }

    private static void line(StringBuilder text, Review.OfRegion region, String picture, Likeness likeness) {
        text.append(region.note()).append(',').append(region.region()).append(',').append(picture);
        for (Figure figure : FIGURES) {
            double value = figure.value().applyAsDouble(likeness);
            text.append(',').append(Double.isNaN(value) ? "nan" : Double.isInfinite(value) ? "inf" : String.valueOf(value));
        }
        text.append("\r\n");
    }

    /** The table for people: each figure of the original and of got, both against wanted, and a line a view about the frames. */
    public static String table(Review review) {
        List<List<String>> rows = new ArrayList<>();
        List<String> head = new ArrayList<>(List.of("note", "region"));
        FIGURES.forEach(figure -> head.add(figure.head()));
        rows.add(head);
        for (Review.OfRegion region : review.regions()) {
            List<String> row = new ArrayList<>(List.of(region.note(), region.region()));
            FIGURES.forEach(f -> row.add(shown(f, region.original()) + " > " + shown(f, region.got())));
            rows.add(row);
        }
        StringBuilder text = new StringBuilder("Against wanted, original > got:\n");
        for (List<String> row : rows) {
            StringBuilder line = new StringBuilder();
            for (int c = 0; c < row.size(); c++) {
                int column = c;
                int width = rows.stream().mapToInt(r -> r.get(column).length()).max().orElse(0);
                line.append(String.format(Locale.ROOT, "%-" + width + "s", row.get(c))).append(GAP);
            }
            text.append(line.toString().stripTrailing()).append('\n');
        }
        review.views().forEach(view -> text.append(words(view)).append('\n'));
        return text.toString().stripTrailing();
    }

    private static String shown(Figure figure, Likeness likeness) {
        double value = figure.value().applyAsDouble(likeness);
        return Double.isNaN(value) ? "-" : Double.isInfinite(value) ? "inf" : String.format(Locale.ROOT, figure.format(), value);
    }

    private static String words(Review.OfView view) {
        List<Review.OfFrame> moving = view.frames().subList(1, view.frames().size());
        Review.OfFrame flicker = moving.stream().max(Comparator.comparingDouble(Review.OfFrame::added)).orElseThrow();
        Review.OfFrame away = view.frames().stream().max(Comparator.comparingDouble(Review.OfFrame::fromOriginal)).orElseThrow();
        return String.format(Locale.ROOT,
                "View %s, frame to frame: mean change %.5f before, %.5f after; most added %.5f at frame %d; farthest from the original "
                        + "%.5f at frame %d.",
                view.view(), moving.stream().mapToDouble(Review.OfFrame::before).average().orElse(0),
                moving.stream().mapToDouble(Review.OfFrame::after).average().orElse(0), flicker.added(), flicker.frame(),
                away.fromOriginal(), away.frame());
    }
}
