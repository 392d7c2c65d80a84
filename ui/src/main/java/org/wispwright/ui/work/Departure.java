package org.wispwright.ui.work;

import java.util.List;
import java.util.stream.IntStream;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.solve.Solve;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.Takes;

/**
 * How far the frames without a note have left the original: over every third such frame and each view that has a note, the sum of
 * squared differences of the two takes' pictures as a share of the sum of the original's squares. Pictures as small as in a solve.
 */
final class Departure {
    private static final int EVERY = 3;

    private Departure() {
    }

    /** The share; 0 if there is no such frame. */
    static double of(Shot shot, Takes takes, int take, Lanes lanes, Cancel cancel) {
        FlowSetup flow = shot.flow();
        List<View> views = shot.views().stream().map(v -> v.view())
                .filter(view -> shot.notes().stream().map(Note::view).anyMatch(view.name()::equals))
                .map(view -> Solve.proxy(view, flow.grid().cellMetres())).toList();
        int[] frames = IntStream.rangeClosed(flow.frames().first() + 1, flow.frames().last())
                .filter(frame -> (frame - flow.frames().first()) % EVERY == 0)
                .filter(frame -> shot.notes().stream().noneMatch(note -> note.frame() == frame)).toArray();
        double apart = 0;
        double all = 0;
        for (int frame : frames) {
            cancel.stopIfWished();
            for (View view : views) {
                Picture original = PictureWork.picture(shot, takes.density(0, frame, flow), view, lanes);
                Picture got = PictureWork.picture(shot, takes.density(take, frame, flow), view, lanes);
                for (int n = 0; n < original.rgba().length; n++) {
                    double o = original.rgba()[n];
                    double d = got.rgba()[n] - o;
                    apart += d * d;
                    all += o * o;
                }
            }
        }
        return all > 0 ? apart / all : 0;
    }
}
