package org.wispwright.ui.job;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.SerializationFeature;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import javax.imageio.ImageIO;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.report.Lettering;
import org.wispwright.ui.report.Sheet;
import org.wispwright.ui.report.SheetRow;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.RenderedFrame;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.ShotView;
import org.wispwright.ui.shot.Takes;
import org.wispwright.warp.loss.LossChoice;
import org.wispwright.warp.loss.PictureMeasure;
import org.wispwright.warp.loss.PyramidLoss;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.retouch.Folds;

/** Compares takes: the pictures of every note, how far each is met, one sheet for people and one report for programs. */
public final class CompareWork {
    private static final ObjectMapper JSON = JsonMapper.builder().enable(SerializationFeature.INDENT_OUTPUT).build();

    private CompareWork() {
    }

    /**
     * Draws and measures every note of a shot.
     *
     * @param before the take to compare against; 0 is usual
     * @param after the take to judge
     * @throws ShotException if a take is missing, damaged or of another set-up, the shot has no note, or a note changes nothing
     * @throws Cancel.Cancelled if cancelled
     */
    public static Comparison compare(ShotFolder folder, Shot shot, int before, int after, Lanes lanes, Progress progress, Cancel cancel) {
        FlowSetup flow = shot.flow();
        Takes takes = Takes.of(folder);
        for (int take : new int[] {0, before, after}) {
            takes.requireOf(take, flow);
        }
        if (shot.notes().isEmpty() && !shot.off().isEmpty()) {
            throw new ShotException(new Finding("notes", "",
                    "every note is off, so there is nothing to compare; turn one on with 'note on SHOT ID'."));
        }
        if (shot.notes().isEmpty()) {
            throw new ShotException(new Finding("notes", "",
                    "there is no note, so there is nothing to compare; add a file notes/ID.json (docs/shot-folder.md)."));
        }
        List<Comparison.OfNote> notes = new ArrayList<>();
        for (Note note : shot.notes()) {
            cancel.stopIfWished();
            progress.now("compare: note " + note.id());
            ShotView view = shot.view(note.view()).orElseThrow();
            Picture original = PictureWork.picture(shot, takes.density(0, note.frame(), flow), view.view(), lanes);
            Picture shown = before == 0 ? original : PictureWork.picture(shot, takes.density(before, note.frame(), flow), view.view(),
                    lanes);
            Picture got = PictureWork.picture(shot, takes.density(after, note.frame(), flow), view.view(), lanes);
            notes.add(ofNote(note, original, shown, got));
        }
        return new Comparison(before, after, notes);
    }

    /** Measures one note. All three pictures have the raster of its view. */
    static Comparison.OfNote ofNote(Note note, Picture original, Picture shown, Picture got) {
        NoteWish wish = new NoteWish(note);
        Picture wanted = wish.wanted(original);
        float[] weights = wish.weights(original);
        PyramidLoss loss = new PyramidLoss(wanted, weights);
        double met = met(loss, original, got).orElseThrow(() -> new ShotException(new Finding("notes/" + note.id() + ".json", "/retouch",
                "it changes nothing that can be seen on frame " + note.frame()
                + (note.weighBy().isPresent() ? ", where its weighBy counts" : "") + "; check where its strokes and handles lie.")));
        double finest = loss.finest(got) / loss.finest(original);
        LossChoice choice = wish.losses(original, wanted);
        double fall = fall(note, choice, original, wanted, weights, got);
        double change = 0;
        for (Hold hold : note.holds()) {
            if (hold.isIn(note.view(), note.frame())) {
                change = Math.max(change, meanChange(got, original, hold.values(original)));
            }
        }
        return new Comparison.OfNote(note, original, shown, wanted, got, met, finest, change,
                new Comparison.Mass(PictureMeasure.mass(original), PictureMeasure.mass(wanted), PictureMeasure.mass(got)),
                Folds.of(note.retouch(), original), choice, fall);
    }

    /**
     * How far a picture is from the original towards what a note wants: 1 when it is there, 0 at the original, less beyond it.
     *
     * @param original in the note's view on its frame, at any raster of the view
     * @param got      the picture to judge, same raster
     * @return empty if the note changes nothing that can be seen
     */
    public static OptionalDouble met(Note note, Picture original, Picture got) {
        NoteWish wish = new NoteWish(note);
        return met(new PyramidLoss(wish.wanted(original), wish.weights(original)), original, got);
    }

    private static OptionalDouble met(PyramidLoss loss, Picture original, Picture got) {
        double start = loss.value(original);
        boolean seen = start > LossChoice.LEAST_START && loss.finest(original) > 0;
        return seen ? OptionalDouble.of(1 - loss.value(got) / start) : OptionalDouble.empty();
    }

    private static double fall(Note note, LossChoice choice, Picture original, Picture wanted, float[] weights, Picture got) {
        try {
            return choice.fall(original, wanted, weights, got);
        } catch (IllegalArgumentException refused) {
            throw new ShotException(new Finding("notes/" + note.id() + ".json", "/loss", refused.getMessage() + "."), refused);
        }
    }

    /** The sheet of a comparison. */
    public static Sheet sheet(ShotFolder folder, Shot shot, Comparison comparison) {
        List<SheetRow> rows = new ArrayList<>();
        for (Comparison.OfNote n : comparison.notes()) {
            Note note = n.note();
            ShotView view = shot.view(note.view()).orElseThrow();
            Optional<Picture> rendered = Optional.ofNullable(view.rendered().get(note.frame()))
                    .map(file -> RenderedFrame.read(folder, file, "/views/" + shot.views().indexOf(view) + "/rendered/" + note.frame()));
            List<Matte> holds = note.holds().stream().filter(h -> h.isIn(note.view(), note.frame())).flatMap(h -> h.region().stream())
                    .toList();
            rows.add(new SheetRow(note.id(), note.words(), "frame " + note.frame() + ", view " + note.view(), rendered, note.retouch(),
                    holds, note.weighBy(),
                    n.shown(), n.wanted(), n.got(), n.folds(), n.met()));
        }
        String against = comparison.before() == 0 ? "the original" : "take " + Takes.name(comparison.before());
        String subtitle = "take " + Takes.name(comparison.after()) + " against " + against + ", frames " + shot.flow().frames().first()
                + " to " + shot.flow().frames().last();
        return new Sheet(shot.name(), subtitle, comparison.before() == 0 ? "original" : against, shot.background(), rows);
    }

    /** The comparison's figures for other programs. */
    public static ObjectNode report(Comparison comparison) {
        ObjectNode top = JSON.createObjectNode().put("before", comparison.before()).put("after", comparison.after());
        ArrayNode list = top.putArray("notes");
        for (Comparison.OfNote n : comparison.notes()) {
            ObjectNode one = list.addObject().put("id", n.note().id()).put("frame", n.note().frame()).put("view", n.note().view())
                    .put("met", n.met()).put("finestErrorRatio", n.finestErrorRatio()).put("holdChange", n.holdChange())
                    .put("massBefore", n.mass().before()).put("massWanted", n.mass().wanted()).put("massGot", n.mass().got())
                    .put("loss", n.loss().inWords()).put("lossWhy", n.loss().why()).put("lossFall", n.lossFall())
                    .put("foldedCells", n.folds().cells()).put("worstJacobian", n.folds().worstJacobian());
            n.folds().worst().ifPresent(p -> one.putArray("worstFold").add(p.x()).add(p.y()));
        }
        return top;
    }

    /**
     * Writes {@code sheet.png}, {@code compare.json}, {@code measures.csv} and, for every note, {@code ID.original.png},
     * {@code ID.wanted.png}, {@code ID.got.png} and {@code ID.difference.png} (|got - wanted| times the sheet's gain). Each file appears
     * whole.
     *
     * @param out made if it is not there; its parent must be
     * @throws ShotException if the place cannot be written to
     */
    public static void write(ShotFolder folder, Shot shot, Comparison comparison, Review review, Path out, Progress progress) {
        if (!Lettering.works()) {
            progress.milestone("sheet: this machine has no fonts, so it has no words; install fontconfig and a font to see them");
        }
        Sheet sheet = sheet(folder, shot, comparison);
        try {
            if (!Files.isDirectory(out)) {
                Files.createDirectories(out);
            }
        } catch (IOException refused) {
            throw PictureFile.cannotWrite(out, refused);
        }
        for (Comparison.OfNote n : comparison.notes()) {
            String id = n.note().id();
            PictureFile.write(PictureWork.over(n.shown(), shot.background()), out.resolve(id + ".original.png"));
            PictureFile.write(PictureWork.over(n.wanted(), shot.background()), out.resolve(id + ".wanted.png"));
            PictureFile.write(PictureWork.over(n.got(), shot.background()), out.resolve(id + ".got.png"));
            PictureFile.write(out.resolve(id + ".difference.png"),
                    stream -> ImageIO.write(sheet.difference(n.got(), n.wanted()), "png", stream));
        }
        PictureFile.write(out.resolve("sheet.png"), stream -> ImageIO.write(sheet.paint(), "png", stream));
        byte[] csv = ReviewReport.csv(review).getBytes(StandardCharsets.UTF_8);
        PictureFile.write(out.resolve("measures.csv"), stream -> stream.write(csv));
        writeJson(ReviewReport.add(review, report(comparison).put("differenceGain", sheet.gain())), out.resolve("compare.json"));
    }

    /** Writes an object as a file that appears whole. @throws ShotException if the place cannot be written to */
    public static void writeJson(ObjectNode object, Path file) {
        try {
            byte[] bytes = (JSON.writeValueAsString(object) + "\n").getBytes(StandardCharsets.UTF_8);
            PictureFile.write(file, stream -> stream.write(bytes));
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException(impossible);
        }
    }

    /** Weighted mean over pixels and RGBA of the absolute change. */
    static double meanChange(Picture a, Picture b, float[] weights) {
        double sum = 0;
        double all = 0;
        for (int n = 0; n < weights.length; n++) {
            all += weights[n];
            for (int c = 4 * n; c < 4 * n + 4; c++) {
                sum += weights[n] * Math.abs((double) a.rgba()[c] - b.rgba()[c]) / 4;
            }
        }
        return all > 0 ? sum / all : 0;
    }
}
