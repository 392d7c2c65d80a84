package org.wispwright.ui.job;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.function.UnaryOperator;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.VelocityOfPicture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotView;
import org.wispwright.ui.shot.Takes;
import org.wispwright.warp.carry.Between;
import org.wispwright.warp.carry.PictureFlow;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.retouch.Retouch;

/**
 * A note taken to other frames: as it is, along with the smoke, or part of the way to another note. A hold with frames of its own stays
 * with the note it was drawn on, for it holds there already.
 */
public final class CarryWork {
    /** Rows at which the motion of a picture is taken, at most; it is smooth. */
    static final int MOST_ROWS = 360;

    private CarryWork() {
    }

    /**
     * The same retouch and holds on other frames.
     *
     * @param prefix the new ids are {@code prefix-FRAME}
     * @param weight empty for the note's own
     */
    public static List<Note> copies(Note note, String prefix, List<Integer> frames, OptionalDouble weight) {
        return frames.stream().map(frame -> with(note, prefix, frame, note.weighBy(), note.retouch(), own(note),
                weight.orElse(note.weight()))).toList();
    }

    /**
     * The retouch and holds of a note with every position carried by the smoke of a take, as the note's view sees it.
     * <p>From frame f to f + 1 the smoke moves with {@code u = (1 - s) u_f + s u_(f+1), s = (n + 1) / (2 n)} for n substeps a frame: the
     * mean over the substeps of the velocities that carry the density, if they change evenly; with one substep exactly
     * {@code u_(f+1)}. It is seen by {@link VelocityOfPicture} through the mean of both densities; {@link PictureFlow} takes it to
     * positions without smoke and goes one midpoint step a frame. Backwards in time alike.
     *
     * @param copies what {@link #copies} made
     * @throws ShotException if a file of the take is missing or damaged, or what comes out is no retouch any more
     * @throws Cancel.Cancelled if cancelled
     */
    public static List<Note> followed(Shot shot, Takes takes, int take, Note note, List<Note> copies, Lanes lanes, Cancel cancel) {
        ShotView view = shot.view(note.view()).orElseThrow();
        Following following = new Following(shot, takes, take, view.view(), lanes);
        Map<Integer, Note> carried = new TreeMap<>();
        for (int direction : new int[] {1, -1}) {
            int end = copies.stream().mapToInt(Note::frame).filter(f -> (f - note.frame()) * direction > 0)
                    .reduce(note.frame(), (a, b) -> (b - a) * direction > 0 ? b : a);
            Retouch retouch = note.retouch();
            List<Hold> holds = own(note);
            Optional<Matte> weighBy = note.weighBy();
            for (int frame = note.frame(); frame != end; frame += direction) {
                cancel.stopIfWished();
                UnaryOperator<Point> map = following.step(frame, frame + direction);
                int to = frame + direction;
                try {
                    retouch = retouch.moved(map);
                    weighBy = weighBy.map(matte -> matte.moved(map));
                    holds = holds.stream().map(hold -> follows(hold, note) ? hold.in(hold.region().map(m -> m.moved(map))) : hold).toList();
                } catch (IllegalArgumentException refused) {
                    throw new ShotException(new Finding("notes/" + note.id() + ".json", "/retouch", "carried to frame " + to + ", "
                            + refused.getMessage() + "; carry it to frames nearer to " + note.frame() + ", or do not let it follow."),
                            refused);
                }
                for (Note copy : copies) {
                    if (copy.frame() == to) {
                        carried.put(to, new Note(copy.id(), copy.words(), to, copy.view(), copy.weight(), weighBy, retouch,
                                at(holds, to), note.loss()));
                    }
                }
            }
        }
        return List.copyOf(carried.values());
    }

    /**
     * Notes part of the way between two of one view.
     *
     * @param every of the frames between, each such one from the first note's on
     * @param ease start and end slowly: {@code share^2 (3 - 2 share)} in place of the share
     * @param weight empty for what lies between the two notes' weights
     * @throws ShotException if the notes or their operations do not match, in one sentence that says which
     */
    public static List<Note> between(Note a, Note b, String prefix, int every, boolean ease, OptionalDouble weight) {
        String file = "notes/" + b.id() + ".json";
        if (!a.view().equals(b.view())) {
            throw new ShotException(new Finding(file, "/view", "the first note is of view '" + a.view() + "' and this one of '" + b.view()
                    + "'; give two notes of one view."));
        }
        if (b.frame() - a.frame() <= every) {
            throw new ShotException(new Finding(file, "/frame", "from frame " + a.frame() + " of the first note to frame " + b.frame()
                    + " of this one there is none to make with --every " + every + "; give two notes farther apart, the earlier first."));
        }
        List<Hold> ownA = own(a);
        List<Hold> ownB = own(b);
        if (ownA.size() != ownB.size()) {
            throw new ShotException(new Finding(file, "/holds", "the first note has " + ownA.size() + " holds on its frame and this one "
                    + ownB.size() + "; give both the same number."));
        }
        if (a.weighBy().isPresent() != b.weighBy().isPresent()) {
            throw new ShotException(new Finding(file, "/weighBy", "one of the two notes has 'weighBy' and the other has not; give it to "
                    + "both or to "
                    + "neither."));
        }
        List<Note> notes = new ArrayList<>();
        for (int frame = a.frame() + every; frame < b.frame(); frame += every) {
            double s = (double) (frame - a.frame()) / (b.frame() - a.frame());
            double share = ease ? s * s * (3 - 2 * s) : s;
            try {
                List<Hold> holds = new ArrayList<>();
                for (int n = 0; n < ownA.size(); n++) {
                    holds.add(between("hold " + (n + 1), ownA.get(n), ownB.get(n), share).at(frame));
                }
                Optional<Matte> weighBy = a.weighBy().map(matte -> Between.matte("'weighBy'", matte, b.weighBy().orElseThrow(), share));
                notes.add(with(a, prefix, frame, weighBy, Between.retouch(a.retouch(), b.retouch(), share), holds,
                        weight.orElse(a.weight() + share * (b.weight() - a.weight()))));
            } catch (IllegalArgumentException unlike) {
                throw new ShotException(new Finding(file, "/retouch", "nothing lies between '" + a.id() + "' and '" + b.id() + "': "
                        + unlike.getMessage() + "."), unlike);
            }
        }
        return notes;
    }

    private static Note with(Note note, String prefix, int frame, Optional<Matte> weighBy, Retouch retouch, List<Hold> holds,
                             double weight) {
        return new Note(prefix + "-" + frame, note.words(), frame, note.view(), weight, weighBy, retouch, at(holds, frame), note.loss());
    }

    /** Holds of the note's frame alone. */
    private static List<Hold> own(Note note) {
        return note.holds().stream().filter(hold -> hold.isOf(note.frame())).toList();
    }

    /** A hold's region moves with the smoke of its note's view; what is held in another view stays where it is there. */
    private static boolean follows(Hold hold, Note note) {
        return hold.view().map(note.view()::equals).orElse(true);
    }

    private static Hold between(String name, Hold a, Hold b, double share) {
        if (a.held() != b.held() || !a.view().equals(b.view()) || a.region().isPresent() != b.region().isPresent()) {
            throw new IllegalArgumentException(name + " of the one and of the other do not hold the same thing of the same view");
        }
        Optional<Matte> region = a.region().map(matte -> Between.matte(name, matte, b.region().orElseThrow(), share));
        return new Hold(region, a.view(), a.spans(), a.held(), a.weight() + share * (b.weight() - a.weight()));
    }

    private static List<Hold> at(List<Hold> holds, int frame) {
        return holds.stream().map(hold -> hold.at(frame)).toList();
    }

    /** The smoke's motion from frame to frame, in one view. */
    private static final class Following {
        private final Shot shot;
        private final Takes takes;
        private final int take;
        private final View view;
        private final VelocityOfPicture motion;
        private int lastFrame = -1;
        private SmokeState last;

        private Following(Shot shot, Takes takes, int take, View view, Lanes lanes) {
            this.shot = shot;
            this.takes = takes;
            this.take = take;
            this.view = view.raster().height() > MOST_ROWS ? view.withRasterHeight(MOST_ROWS) : view;
            motion = new VelocityOfPicture(shot.flow().grid(), this.view, PictureWork.STEP_CELLS * shot.flow().grid().cellMetres(), lanes);
        }

        /** Where positions go between two frames next to each other. */
        private UnaryOperator<Point> step(int from, int to) {
            SmokeState start = from == lastFrame ? last : takes.state(take, from, shot.flow());
            SmokeState end = takes.state(take, to, shot.flow());
            SmokeState earlier = from < to ? start : end;
            SmokeState later = from < to ? end : start;
            int substeps = shot.flow().substeps();
            float s = (float) ((substeps + 1) / (2.0 * substeps));
            MacVelocity u = new MacVelocity(shot.flow().grid());
            mix(earlier.velocity().x(), later.velocity().x(), s, u.x());
            mix(earlier.velocity().y(), later.velocity().y(), s, u.y());
            mix(earlier.velocity().z(), later.velocity().z(), s, u.z());
            ScalarGrid density = new ScalarGrid(shot.flow().grid());
            mix(earlier.density().values(), later.density().values(), 0.5f, density.values());
            float[] seen = new float[3 * view.raster().width() * view.raster().height()];
            motion.motion(density, u, shot.look().extinction(), seen);
            PictureFlow flow = new PictureFlow(view.raster().width(), view.raster().height(), seen);
            lastFrame = to;
            last = end;
            double seconds = (to - from) * shot.flow().frames().secondsPerFrame();
            return position -> flow.carried(position, seconds);
        }

        private static void mix(float[] a, float[] b, float s, float[] out) {
            for (int n = 0; n < out.length; n++) {
                out[n] = (1 - s) * a[n] + s * b[n];
            }
        }
    }
}
