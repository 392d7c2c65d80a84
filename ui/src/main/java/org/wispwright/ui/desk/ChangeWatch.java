package org.wispwright.ui.desk;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ExecutorService;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.job.Departure;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.Takes;

/**
 * How far each frame of a take has left the original in a view, for a plot: {@link Departure#share}. Worked out beside the desk, coarsely
 * over the whole range first, and kept.
 */
public final class ChangeWatch {
    /** A longer range is sampled: a plot on a screen shows no more. */
    static final int MOST_FRAMES = 200;
    private static final int MOST = 20_000;

    private final Gathering<Key, Double> gathering;

    private record Key(ShotFolder folder, int take, String view, int frame) {
    }

    ChangeWatch(Workers workers, ExecutorService lane) {
        gathering = new Gathering<>(workers, lane, MOST);
    }

    /** Squared differences as a share of the original's squares, if they have been worked out. */
    public Optional<Double> of(OpenShot now, int take, String view, int frame) {
        return gathering.get(new Key(now.folder(), take, view, frame));
    }

    /**
     * Has it worked out for the frames of the range, in place of what was asked under that name before.
     *
     * @param who  who asks
     * @param now  the shot
     * @param take that is there and of this set-up, as the original must be; for the original nothing is worked out
     * @param came on the desk's thread, after each frame
     */
    public void want(String who, OpenShot now, int take, String view, Runnable came) {
        List<Integer> frames = take == 0 ? List.of() : frames(now.setup().flow().frames());
        gathering.want(who, frames.stream().map(frame -> new Key(now.folder(), take, view, frame)).toList(), (key, cancel) -> {
            FlowSetup flow = now.setup().flow();
            Takes takes = Takes.of(now.folder());
            try (Lanes lanes = new Lanes(1)) {
                return Departure.share(now.setup(), now.setup().view(view).orElseThrow().view(), takes.density(0, key.frame(), flow),
                        takes.density(take, key.frame(), flow), lanes);
            }
        }, came);
    }

    /** Frames in the order in which they are worked out: every eighth, then every fourth, second, all; at most {@link #MOST_FRAMES}. */
    static List<Integer> frames(FrameRange range) {
        int stride = (range.count() + MOST_FRAMES - 1) / MOST_FRAMES;
        Set<Integer> frames = new LinkedHashSet<>();
        for (int step = 8 * stride; step >= stride; step /= 2) {
            for (int frame = range.first(); frame <= range.last(); frame += step) {
                frames.add(frame);
            }
        }
        return new ArrayList<>(frames);
    }
}
