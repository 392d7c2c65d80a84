package org.wispwright.ui.job;

import java.util.List;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.solve.Solve;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.ScalarGrid;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.Shot;

/**
 * How far the frames without a note have left the original: over every third such frame and each view that has a note, the sum of
 * squared differences of the two takes' pictures as a share of the sum of the original's squares. Pictures as small as in a solve.
 *
 * @param all    over the whole range; what follows a note carries it on, so this is never small
 * @param before over the frames before the last noted one, which the stay term speaks for
 */
public record Departure(double all, double before) {
    private static final int EVERY = 3;

    /** The frames that are looked at. */
    static int[] frames(Shot shot) {
        FlowSetup flow = shot.flow();
        return IntStream.rangeClosed(flow.frames().first() + 1, flow.frames().last())
                .filter(frame -> (frame - flow.frames().first()) % EVERY == 0)
                .filter(frame -> shot.notes().stream().noneMatch(note -> note.frame() == frame)).toArray();
    }

    /**
     * The shares; 0 where there is no such frame. {@code original} and {@code take} give the density of a frame, on any grid of the box.
     */
    static Departure of(Shot shot, IntFunction<ScalarGrid> original, IntFunction<ScalarGrid> take, Lanes lanes, Cancel cancel) {
        List<View> views = shot.views().stream().map(v -> v.view())
                .filter(view -> shot.notes().stream().map(Note::view).anyMatch(view.name()::equals))
                .map(view -> Solve.proxy(view, shot.flow().grid().cellMetres())).toList();
        int lastNoted = shot.notes().stream().mapToInt(Note::frame).max().orElse(0);
        double[] apart = new double[2];
        double[] whole = new double[2];
        for (int frame : frames(shot)) {
            cancel.stopIfWished();
            ScalarGrid was = original.apply(frame);
            ScalarGrid is = take.apply(frame);
            for (View view : views) {
                Apart one = apart(shot, view, was, is, lanes);
                for (int span = 0; span < (frame < lastNoted ? 2 : 1); span++) {
                    apart[span] += one.differences();
                    whole[span] += one.squares();
                }
            }
        }
        return new Departure(whole[0] > 0 ? apart[0] / whole[0] : 0, whole[1] > 0 ? apart[1] / whole[1] : 0);
    }

    /**
     * The same for one frame in one view: squared differences as a share of the original's squares; 0 where the original shows nothing.
     *
     * @param was the original's density
     * @param is  another take's density of the same frame
     */
    public static double share(Shot shot, View view, ScalarGrid was, ScalarGrid is, Lanes lanes) {
        Apart one = apart(shot, Solve.proxy(view, shot.flow().grid().cellMetres()), was, is, lanes);
        return one.squares() > 0 ? one.differences() / one.squares() : 0;
    }

    private record Apart(double differences, double squares) {
    }

    private static Apart apart(Shot shot, View view, ScalarGrid was, ScalarGrid is, Lanes lanes) {
        Picture before = PictureWork.picture(shot, was, view, lanes);
        Picture after = PictureWork.picture(shot, is, view, lanes);
        double squares = 0;
        double differences = 0;
        for (int n = 0; n < before.rgba().length; n++) {
            double o = before.rgba()[n];
            double d = after.rgba()[n] - o;
            differences += d * d;
            squares += o * o;
        }
        return new Apart(differences, squares);
    }
}
