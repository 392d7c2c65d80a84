package org.wispwright.ui.desk;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.stream.Stream;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.View;
import org.wispwright.ui.desk.TakeWork.Writing;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.CompareWork;
import org.wispwright.ui.job.Comparison;
import org.wispwright.ui.job.PictureFile;
import org.wispwright.ui.job.PictureWork;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.ReviewWork;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.Takes;

/**
 * Writes the take that is shown out for others: its pictures, a contact sheet, its files. Each goes into a new folder below the one that
 * the person chose; it is there whole or not at all, and nothing that was there is written over. One at a time. Desk's thread.
 */
public final class WritingOut {
    private final Desk desk;
    private final Workers workers;
    private final Replacing writing;

    WritingOut(Desk desk, Workers workers) {
        this.desk = desk;
        this.workers = workers;
        ExecutorService lane = workers.lane("write-out");
        writing = new Replacing(workers, lane);
    }

    /** What is written, on the lane. */
    @FunctionalInterface
    private interface Body {
        void into(Path folder, Lanes lanes, Progress progress, Cancel cancel) throws IOException;
    }

    /** True if a take is shown that can be written out, and nothing is being written. */
    public static boolean can(DeskState s) {
        return s.takeShown().isPresent() && s.work().writing().isEmpty();
    }

    /** True if the take that is shown can be compared on a sheet: it is not the original, and there are notes. */
    public static boolean canSheet(DeskState s) {
        return can(s) && s.takeShown().map(take -> take.number() > 0).orElse(false) && !s.shot().orElseThrow().asItIs().notes().isEmpty();
    }

    /**
     * Pictures of the take that is shown, in the view that is shown, at the view's own size over the shot's background.
     *
     * @param chosen an existing folder
     * @param whole  true for every frame, false for the frame that is shown
     */
    public void pictures(Path chosen, boolean whole) {
        DeskState s = desk.state();
        if (!can(s)) {
            return;
        }
        Shot shot = s.shot().orElseThrow().setup();
        Takes takes = Takes.of(s.shot().get().folder());
        int take = s.takeShown().orElseThrow().number();
        Showing showing = s.showing().orElseThrow();
        View view = shot.view(showing.view()).orElseThrow().view();
        int first = whole ? shot.flow().frames().first() : showing.frame();
        int last = whole ? shot.flow().frames().last() : showing.frame();
        String name = named(s, take) + "-" + showing.view();
        write(chosen, name, (folder, lanes, progress, cancel) -> {
            takes.requireOf(take, shot.flow());
            for (int frame = first; frame <= last; frame++) {
                cancel.stopIfWished();
                progress.now("pictures: frame " + frame + " of " + last);
                PictureFile.write(PictureWork.over(PictureWork.picture(shot, takes.density(take, frame, shot.flow()), view, lanes),
                        shot.background()), folder.resolve(String.format(Locale.ROOT, "%s.%04d.png", name, frame)));
            }
        });
    }

    /**
     * A contact sheet of the take that is shown, against what it is set against if that is a take, else the original.
     *
     * @param chosen an existing folder
     */
    public void sheet(Path chosen) {
        DeskState s = desk.state();
        if (!canSheet(s)) {
            return;
        }
        OpenShot open = s.shot().orElseThrow();
        Shot shot = open.asItIs();
        int after = s.takeShown().orElseThrow().number();
        int before = s.showing().orElseThrow().far() instanceof Source.Take far && far.number() != after ? far.number() : 0;
        write(chosen, named(s, after) + "-sheet", (folder, lanes, progress, cancel) -> {
            Comparison comparison = CompareWork.compare(open.folder(), shot, before, after, lanes, progress, cancel);
            CompareWork.write(open.folder(), shot, comparison,
                    ReviewWork.of(open.folder(), shot, comparison, lanes, progress, cancel), folder, progress);
        });
    }

    /**
     * A copy of the files of the take that is shown: its volumes, its force, where it comes from.
     *
     * @param chosen an existing folder
     */
    public void files(Path chosen) {
        DeskState s = desk.state();
        if (!can(s)) {
            return;
        }
        int take = s.takeShown().orElseThrow().number();
        Path from = s.shot().orElseThrow().folder().inside("takes/" + Takes.name(take));
        write(chosen, named(s, take), (folder, lanes, progress, cancel) -> {
            List<Path> all;
            try (Stream<Path> files = Files.list(from)) {
                all = files.filter(Files::isRegularFile).sorted().toList();
            }
            for (int n = 0; n < all.size(); n++) {
                cancel.stopIfWished();
                progress.now("files: " + (n + 1) + " of " + all.size());
                Files.copy(all.get(n), folder.resolve(all.get(n).getFileName().toString()));
            }
        });
    }

    /** Stops what is being written; nothing of it stays. */
    public void stop() {
        writing.drop();
        desk.look(s -> s.withWork(w -> w.withWriting(Optional.empty())));
    }

    private static String named(DeskState s, int take) {
        String shot = String.valueOf(s.shot().orElseThrow().folder().root().getFileName()).replaceAll("[^\\p{L}\\p{N}._-]+", "-");
        return shot + "-take-" + Takes.name(take);
    }

    private void write(Path chosen, String name, Body body) {
        desk.look(s -> s.withWork(w -> w.withWriting(Optional.of(new Writing(name)))));
        writing.replace(cancel -> {
            try (NewFolder folder = NewFolder.begin(chosen, name); Lanes lanes = new Lanes(SolveRun.lanes())) {
                Thread.currentThread().setPriority(Thread.MIN_PRIORITY);
                try {
                    body.into(folder.path(), lanes, new Told(cancel), cancel);
                } catch (IOException refused) {
                    throw folder.cannotWrite(refused);
                }
                cancel.stopIfWished();
                return folder.finish();
            }
        }, written -> over(Message.Kind.DONE, "Written: " + written), refused -> over(Message.Kind.FAULT, Desk.words(refused)));
    }

    private void over(Message.Kind kind, String words) {
        desk.look(s -> s.withWork(w -> w.withWriting(Optional.empty())));
        desk.say(kind, words);
    }

    /** Tells the desk where the writing is. */
    private final class Told implements Progress {
        private final Cancel cancel;

        Told(Cancel cancel) {
            this.cancel = cancel;
        }

        @Override
        public void now(String line) {
            workers.onDesk(() -> {
                if (!cancel.wished()) {
                    desk.look(s -> s.withWork(w -> w.withWriting(w.writing().map(now -> new Writing(line)))));
                }
            });
        }

        @Override
        public void milestone(String line) {
            now(line);
        }
    }
}
