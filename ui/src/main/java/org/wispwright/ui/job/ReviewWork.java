package org.wispwright.ui.job;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.solve.Solve;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.ScalarGrid;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.ShotView;
import org.wispwright.ui.shot.Takes;
import org.wispwright.warp.loss.PictureMeasure;
import org.wispwright.warp.measure.ContinuityMeter;
import org.wispwright.warp.measure.Likeness;
import org.wispwright.warp.retouch.Retoucher;

/** Measures a comparison for a review: how alike got and wanted are, region by region, and how steady the takes are over the frames. */
public final class ReviewWork {
    private ReviewWork() {
    }

    /**
     * All measures. Draws every frame of both takes, and of take 0, in each view with a note, small.
     *
     * @throws org.wispwright.ui.shot.ShotException if a take is missing or damaged
     * @throws Cancel.Cancelled if cancelled
     */
    public static Review of(ShotFolder folder, Shot shot, Comparison comparison, Lanes lanes, Progress progress, Cancel cancel) {
        List<Review.OfRegion> regions = new ArrayList<>();
        for (Comparison.OfNote note : comparison.notes()) {
            cancel.stopIfWished();
            progress.now("measure: note " + note.note().id());
            regions.addAll(regions(note));
        }
        return new Review(regions, views(folder, shot, comparison, lanes, progress, cancel));
    }

    /** The regions of one note, in their order. */
    static List<Review.OfRegion> regions(Comparison.OfNote of) {
        Note note = of.note();
        Picture original = of.original();
        List<Review.OfRegion> regions = new ArrayList<>();
        float[] retouched = Retoucher.touched(note.retouch(), original, NoteWish.FEATHER);
        float[] elsewhere = new float[retouched.length];
        Arrays.fill(elsewhere, 1f);
        regions.add(region(of, "frame", elsewhere));
        regions.add(region(of, "retouched", retouched));
        without(elsewhere, retouched);
        for (int n = 0; n < note.holds().size(); n++) {
            Hold hold = note.holds().get(n);
            if (hold.isIn(note.view(), note.frame())) {
                float[] held = hold.values(original);
                regions.add(region(of, "hold " + (n + 1), held));
                without(elsewhere, held);
            }
        }
        regions.add(region(of, "elsewhere", elsewhere));
        return regions;
    }

    private static Review.OfRegion region(Comparison.OfNote of, String name, float[] weights) {
        return new Review.OfRegion(of.note().id(), name, Likeness.of(of.got(), of.wanted(), weights, Review.LEVEL),
                Likeness.of(of.original(), of.wanted(), weights, Review.LEVEL));
    }

    /** {@code rest = min(rest, 1 - taken)}. */
    private static void without(float[] rest, float[] taken) {
        for (int p = 0; p < rest.length; p++) {
            rest[p] = Math.min(rest[p], 1 - taken[p]);
        }
    }

    private static List<Review.OfView> views(ShotFolder folder, Shot shot, Comparison comparison, Lanes lanes, Progress progress,
            Cancel cancel) {
        FlowSetup flow = shot.flow();
        FrameRange range = flow.frames();
        Takes takes = Takes.of(folder);
        List<View> views = shot.views().stream().map(ShotView::view)
                .filter(view -> shot.notes().stream().map(Note::view).anyMatch(view.name()::equals))
                .map(view -> Solve.proxy(view, flow.grid().cellMetres())).toList();
        List<ContinuityMeter> meters = new ArrayList<>();
        List<List<Double>> fromOriginal = new ArrayList<>();
        for (View view : views) {
            meters.add(new ContinuityMeter(ones(view)));
            fromOriginal.add(new ArrayList<>());
        }
        for (int frame = range.first(); frame <= range.last(); frame++) {
            cancel.stopIfWished();
            progress.now("measure: frame " + frame);
            Picture[] before = pictures(shot, takes, comparison.before(), frame, views, lanes);
            Picture[] after = pictures(shot, takes, comparison.after(), frame, views, lanes);
            Picture[] original = comparison.before() == 0 ? before : pictures(shot, takes, 0, frame, views, lanes);
            for (int v = 0; v < views.size(); v++) {
                meters.get(v).add(before[v], after[v]);
                fromOriginal.get(v).add(PictureMeasure.meanAbsoluteDifference(original[v], after[v], ones(views.get(v))));
            }
        }
        List<Review.OfView> all = new ArrayList<>();
        for (int v = 0; v < views.size(); v++) {
            List<Review.OfFrame> frames = new ArrayList<>();
            frames.add(new Review.OfFrame(range.first(), 0, 0, 0, fromOriginal.get(v).get(0)));
            for (ContinuityMeter.Step step : meters.get(v).steps()) {
                int n = step.from() + 1;
                frames.add(new Review.OfFrame(range.first() + n, step.before(), step.after(), step.added(), fromOriginal.get(v).get(n)));
            }
            all.add(new Review.OfView(views.get(v).name(), views.get(v).raster(), frames));
        }
        return all;
    }

    private static Picture[] pictures(Shot shot, Takes takes, int take, int frame, List<View> views, Lanes lanes) {
        ScalarGrid density = takes.density(take, frame, shot.flow());
        return views.stream().map(view -> PictureWork.picture(shot, density, view, lanes)).toArray(Picture[]::new);
    }

    private static float[] ones(View view) {
        float[] ones = new float[view.raster().width() * view.raster().height()];
        Arrays.fill(ones, 1f);
        return ones;
    }
}
