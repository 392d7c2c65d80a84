package org.wispwright.ui.window.easel;

import java.awt.Component;
import java.awt.Container;
import java.awt.Point;
import java.awt.Toolkit;
import java.awt.event.InputEvent;
import java.awt.event.MouseEvent;
import java.io.IOException;
import java.lang.reflect.InvocationTargetException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Locale;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import java.util.function.Consumer;
import javax.swing.RepaintManager;
import javax.swing.SwingUtilities;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.desk.Against;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Memory;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.desk.Workers;
import org.wispwright.ui.job.Beginning;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.Quality;
import org.wispwright.ui.job.SampleWork;
import org.wispwright.ui.job.SolveWork;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.window.DeskWindow;
import org.wispwright.ui.window.Palette;

/**
 * How quickly the desk follows the hand: the sample with frames of 1920 x 1080, in a window of 1900 x 1040 on a screen in memory. Each row is
 * the wall time from an event of the pointer until the window is painted, median and worst of many, after as many to warm up: first at rest,
 * then while a solve runs beside it.
 * <p>{@code java -jar ui/bench/target/desk-bench.jar [ROUNDS]}
 */
public final class DeskTable {
    private final int rounds;
    private final Desk desk;
    private final DeskWindow window;
    private final EaselCanvas canvas;

    private DeskTable(int rounds, Desk desk, DeskWindow window, EaselCanvas canvas) {
        this.rounds = rounds;
        this.desk = desk;
        this.window = window;
        this.canvas = canvas;
    }

    /** Prints the table. @param args rounds of each row; 60 is usual */
    public static void main(String[] args) throws IOException, ClassNotFoundException {
        System.setProperty("java.awt.headless", "false");
        System.setProperty("cacio.managed.screensize", "1920x1080");
        Class.forName("com.github.caciocavallosilano.cacio.ctc.junit.CacioExtension");
        int rounds = args.length > 0 ? Integer.parseInt(args[0]) : 60;
        Path folder = Files.createTempDirectory("desk-bench");
        Path shot = large(folder);
        DeskWindow[] window = new DeskWindow[1];
        Desk desk = onSwing(() -> {
            Palette.use(true, 1);
            Desk made = new Desk(new Workers(SwingUtilities::invokeLater));
            window[0] = new DeskWindow(made, new Memory(folder.resolve("desk.properties")));
            window[0].frame().setBounds(0, 0, 1900, 1040);
            window[0].frame().setVisible(true);
            made.open(shot);
            return made;
        });
        until(() -> desk.state().shot().isPresent());
        EaselCanvas canvas = (EaselCanvas) find(window[0].frame(), "easel-picture");
        DeskTable table = new DeskTable(rounds, desk, window[0], canvas);
        System.out.printf(Locale.ROOT, "%-34s %8s %8s%n", "1920 x 1080, ms", "median", "worst");
        table.all("");
        onSwing(() -> {
            window[0].actions().get("take.solve").actionPerformed(null);
            return null;
        });
        until(() -> desk.state().work().running().isPresent());
        table.all(", solving");
        System.exit(0);
    }

    /** The sample with a wide view of 1920 x 1080, its original and one short take. */
    private static Path large(Path folder) throws IOException {
        Path shot = SampleWork.copyBelow(folder);
        Path setup = shot.resolve("shot.json");
        String text = Files.readString(setup);
        Files.writeString(setup, text.replaceFirst("\"gateMm\": \\[27, 36\\]", "\"gateMm\": [64, 36]").replaceFirst("\\[360, 480\\]", "[1920, 1080]")
                .replaceFirst("\"rendered\": \\{[^}]*\\}", "\"rendered\": {}"));
        ShotFolder opened = ShotFolder.open(shot);
        try (Lanes lanes = new Lanes(Runtime.getRuntime().availableProcessors())) {
            SolveWork.run(opened, ShotCheck.requireForNotes(opened), new SolveWork.Manner(Runtime.getRuntime().maxMemory(), 0,
                    new StopRule(0, Double.POSITIVE_INFINITY, 2), true, false, Quality.PREVIEW, Beginning.ANEW), lanes, Progress.SILENT,
                    new Cancel());
        }
        return shot;
    }

    private void all(String more) {
        brush(more);
        handle(more);
        divider(more);
        scrub(more);
    }

    private void brush(String more) {
        act("hand.add");
        until(() -> canvas.tool() instanceof BrushTool tool && tool.retouching.isAtRest());
        row("brush segment to repaint" + more, Way.CIRCLE, 0.35, 0.4);
        undo();
    }

    private void handle(String more) {
        act("hand.pull");
        until(() -> canvas.tool() instanceof PullTool tool && tool.retouching.isAtRest());
        Point handle = onSwing(() -> {
            java.awt.geom.Point2D p = canvas.placement().toScreen(new org.wispwright.warp.matte.Point(0.243 + 0.514, 0.081));
            return new Point((int) p.getX(), (int) p.getY());
        });
        row("handle drag to repaint" + more, Way.NEAR, (double) handle.x / canvas.getWidth(), (double) handle.y / canvas.getHeight());
        undo();
    }

    private void divider(String more) {
        onSwing(() -> {
            desk.look(s -> s.withHand(org.wispwright.ui.desk.Hand.LOOK));
            desk.show(s -> s.withNear(new Source.Take(1)).withFar(Source.ORIGINAL).withAgainst(Against.DIVIDER));
            return null;
        });
        pause(4000);
        row("divider drag to repaint" + more, Way.CIRCLE, 0.5, 0.5);
        onSwing(() -> {
            desk.show(s -> s.withAgainst(Against.ALONE));
            return null;
        });
    }

    /** From the wish for another frame until a picture of it is painted. */
    private void scrub(String more) {
        double[] millis = new double[rounds];
        for (int n = -rounds / 4; n < rounds; n++) {
            int frame = 1003 + Math.floorMod(n * 7, 44);
            long start = System.nanoTime();
            onSwing(() -> {
                desk.show(s -> s.withFrame(frame));
                return null;
            });
            while (!onSwing(canvas::isOfFrameShown)) {
                Thread.onSpinWait();
            }
            painted();
            if (n >= 0) {
                millis[n] = (System.nanoTime() - start) / 1e6;
            }
            pause(60);
        }
        tell("scrub to picture" + more, millis);
        onSwing(() -> {
            desk.show(s -> s.withFrame(1038));
            return null;
        });
        pause(3000);
    }

    /** How the pointer goes. */
    private enum Way { CIRCLE, NEAR }

    private void row(String name, Way path, double x, double y) {
        double[] millis = new double[rounds];
        int cx = (int) (x * canvas.getWidth());
        int cy = (int) (y * canvas.getHeight());
        mouse(MouseEvent.MOUSE_MOVED, cx, cy, 0);
        mouse(MouseEvent.MOUSE_PRESSED, cx, cy, InputEvent.BUTTON1_DOWN_MASK);
        painted();
        for (int n = -rounds; n < rounds; n++) {
            double turn = 0.21 * n;
            double far = path == Way.NEAR ? 12 : 140;
            long start = System.nanoTime();
            mouse(MouseEvent.MOUSE_DRAGGED, cx + (int) (far * Math.sin(turn)), cy + (int) (far * (1 - Math.cos(turn))),
                    InputEvent.BUTTON1_DOWN_MASK);
            painted();
            if (n >= 0) {
                millis[n] = (System.nanoTime() - start) / 1e6;
            }
            pause(8);
        }
        mouse(MouseEvent.MOUSE_RELEASED, cx, cy, 0);
        painted();
        pause(500);
        tell(name, millis);
    }

    private static void tell(String name, double[] millis) {
        Arrays.sort(millis);
        System.out.printf(Locale.ROOT, "%-34s %8.1f %8.1f%n", name, millis[millis.length / 2], millis[millis.length - 1]);
    }

    private void mouse(int kind, int x, int y, int modifiers) {
        Toolkit.getDefaultToolkit().getSystemEventQueue().postEvent(new MouseEvent(canvas, kind, System.currentTimeMillis(), modifiers, x, y, 1,
                false, kind == MouseEvent.MOUSE_DRAGGED || kind == MouseEvent.MOUSE_MOVED ? MouseEvent.NOBUTTON : MouseEvent.BUTTON1));
    }

    /** Waits until what waits in the event queue, and what that asks for, is painted. */
    private static void painted() {
        for (int n = 0; n < 2; n++) {
            onSwing(() -> null);
        }
        onSwing(() -> {
            RepaintManager.currentManager(null).paintDirtyRegions();
            return null;
        });
    }

    private void act(String id) {
        onSwing(() -> {
            window.actions().get(id).actionPerformed(null);
            return null;
        });
    }

    private void undo() {
        onSwing(() -> {
            desk.undo();
            return null;
        });
        pause(1500);
    }

    private static void pause(long millis) {
        try {
            Thread.sleep(millis);
        } catch (InterruptedException stop) {
            throw new IllegalStateException(stop);
        }
    }

    private static void until(Callable<Boolean> wished) {
        while (!onSwing(wished)) {
            pause(10);
        }
    }

    private static Component find(Component c, String name) {
        if (name.equals(c.getName())) {
            return c;
        }
        if (c instanceof Container container) {
            for (Component child : container.getComponents()) {
                Component found = find(child, name);
                if (found != null) {
                    return found;
                }
            }
        }
        return null;
    }

    private static <T> T onSwing(Callable<T> task) {
        FutureTask<T> future = new FutureTask<>(task);
        try {
            SwingUtilities.invokeAndWait(future);
            return future.get();
        } catch (InterruptedException | InvocationTargetException | ExecutionException failed) {
            throw new IllegalStateException(failed);
        }
    }
}
