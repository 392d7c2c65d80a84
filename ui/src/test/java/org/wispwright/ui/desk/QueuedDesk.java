package org.wispwright.ui.desk;

import java.nio.file.Path;
import java.util.concurrent.BlockingQueue;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;
import java.util.function.BooleanSupplier;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.SimulateWork;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;

/** A desk without a window: its thread is the test's own, which does what comes back from the workers while it waits. */
public final class QueuedDesk implements AutoCloseable {
    private static final long MOST_SECONDS = 60;

    private final BlockingQueue<Runnable> tasks = new LinkedBlockingQueue<>();
    private final Desk desk = new Desk(new Workers(tasks::add));

    /** The small shot with its original, in a folder. */
    public static Path smallShotIn(Path folder) {
        SmallShot.in(folder);
        ShotFolder shot = ShotFolder.open(folder);
        try (Lanes lanes = new Lanes(1)) {
            SimulateWork.run(shot, ShotCheck.requireForNotes(shot), lanes, org.wispwright.ui.job.Progress.SILENT, new Cancel());
        }
        return folder;
    }

    /** The desk. */
    public Desk desk() {
        return desk;
    }

    /** Opens a shot. */
    public QueuedDesk open(Path folder) {
        desk.open(folder);
        await("the shot is open", () -> desk.state().shot().isPresent());
        return this;
    }

    /** Does the desk's tasks until something holds. @throws AssertionError if it does not come */
    public void await(String what, BooleanSupplier wished) {
        long end = System.nanoTime() + MOST_SECONDS * 1_000_000_000L;
        while (!wished.getAsBoolean()) {
            try {
                Runnable task = tasks.poll(50, TimeUnit.MILLISECONDS);
                if (task != null) {
                    task.run();
                } else if (System.nanoTime() > end) {
                    throw new AssertionError("waited " + MOST_SECONDS + " s and it is still not so: " + what + "; message: "
                            + desk.state().message());
                }
            } catch (InterruptedException stop) {
                throw new IllegalStateException(stop);
            }
        }
    }

    @Override
    public void close() {
        desk.close();
    }
}
