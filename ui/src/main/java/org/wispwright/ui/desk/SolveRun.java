package org.wispwright.ui.desk;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Consumer;
import java.util.function.Supplier;
import java.util.function.UnaryOperator;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.desk.SolveNow.Phase;
import org.wispwright.ui.desk.SolveNow.Point;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.SolveWork;
import org.wispwright.ui.shot.ShotFolder;

/** One solve at work beside the desk: tells how it goes, a few times a second at the most. Runs on the thread that solves. */
final class SolveRun implements Progress {
    private static final long NANOS_BETWEEN = 100_000_000L;
    private static final long NANOS_BETWEEN_PICTURES = 2_000_000_000L;

    private final ShotFolder folder;
    private final SolveStart start;
    private final Cancel cancel;
    private final List<String> notes;
    private final Consumer<UnaryOperator<SolveNow>> told;
    private final Consumer<String> warned;
    private final List<Point> curve = new ArrayList<>();
    private Map<String, Picture> got = Map.of();
    private org.wispwright.optimize.solve.Progress at;
    private boolean untold;
    private long lastTold;
    private long lastPictures;

    /**
     * @param told   of every change of the solve that runs
     * @param warned of sentences that a person should read: a record that could not be written, a damaged one that was passed over
     */
    SolveRun(ShotFolder folder, SolveStart start, Cancel cancel, Consumer<UnaryOperator<SolveNow>> told, Consumer<String> warned) {
        this.folder = folder;
        this.start = start;
        this.cancel = cancel;
        this.told = told;
        this.warned = warned;
        notes = start.shot().notes().stream().map(note -> note.id()).toList();
        lastTold = System.nanoTime() - NANOS_BETWEEN;
        lastPictures = System.nanoTime() - NANOS_BETWEEN_PICTURES;
    }

    /** Solves, on fewer lanes than there are cores: the desk stays quick. @throws RuntimeException as {@link SolveWork#run} */
    SolveWork.Result solve() {
        Thread.currentThread().setPriority(Thread.MIN_PRIORITY);               // its lanes inherit it
        try (Lanes lanes = new Lanes(lanes())) {
            return SolveWork.run(folder, start.shot(), start.digest(), start.manner(), lanes, this, cancel);
        }
    }

    /** Lanes of work that runs beside the desk. */
    static int lanes() {
        return Math.max(1, Runtime.getRuntime().availableProcessors() - 1);
    }

    @Override
    public void now(String line) {
        // The words are for terminals; the desk has the figures.
    }

    @Override
    public void milestone(String line) {
        // Likewise.
    }

    @Override
    public void warning(String line) {
        warned.accept(line);
    }

    @Override
    public void frame(int frame, int last) {
        if (isTime()) {
            told.accept(now -> now.with(new SolveNow.FrameOf(frame, last)));
        }
    }

    @Override
    public void iteration(org.wispwright.optimize.solve.Progress now, Supplier<List<Picture>> pictures) {
        boolean first = at == null || at.rung() != now.rung();
        at = now;
        curve.add(new Point(now.seconds(), now.loss()));
        if (first || System.nanoTime() - lastPictures >= NANOS_BETWEEN_PICTURES) {
            lastPictures = System.nanoTime();
            List<Picture> copies = pictures.get();
            Map<String, Picture> byNote = new LinkedHashMap<>();
            for (int n = 0; n < copies.size(); n++) {
                byNote.put(notes.get(n), copies.get(n));
            }
            got = byNote;
        }
        untold = true;
        if (first || isTime()) {
            tell();
        }
    }

    @Override
    public void waits() {
        tell();
        told.accept(now -> now.wish() == SolveNow.Wish.PAUSE ? now.in(Phase.PAUSED) : now);
    }

    @Override
    public void writesTake() {
        tell();
        told.accept(now -> now.in(Phase.WRITING));
    }

    private void tell() {
        if (untold) {
            untold = false;
            org.wispwright.optimize.solve.Progress now = at;
            List<Point> points = List.copyOf(curve);
            Map<String, Picture> pictures = got;
            told.accept(solve -> solve.with(now, points, pictures));
        }
    }

    private boolean isTime() {
        long time = System.nanoTime();
        if (time - lastTold < NANOS_BETWEEN) {
            return false;
        }
        lastTold = time;
        return true;
    }
}
