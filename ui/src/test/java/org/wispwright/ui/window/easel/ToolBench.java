package org.wispwright.ui.window.easel;

import java.awt.image.BufferedImage;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import javax.swing.SwingUtilities;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.ui.desk.Workers;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.SimulateWork;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.window.DeskDriver;
import org.wispwright.ui.window.Palette;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Window;

/**
 * A desk with the small shot, a surface that only remembers, and a pointer made of numbers. The picture lies at (20, 10), 500 pixels high.
 */
final class ToolBench implements Surface, AutoCloseable {
    static final Placement PLACE = new Placement(20, 10, 500);
    private static final long MOST_SECONDS = 60;

    final Desk desk;
    final Retouching retouching;
    Picture live;
    final List<Window> windows = new ArrayList<>();
    int overlays;
    Tool tool;

    ToolBench(Path shot) {
        Object[] made = DeskDriver.onSwing(() -> {
            Palette.use(true, 1);
            Desk d = new Desk(new Workers(SwingUtilities::invokeLater));
            d.open(shot);
            return new Object[] {d, new Retouching(d, Tools::inWords)};
        });
        desk = (Desk) made[0];
        retouching = (Retouching) made[1];
        await("the shot is open", () -> desk.state().shot().isPresent());
    }

    /** Writes the small shot with its original. */
    static Path shotIn(Path folder) {
        ShotFolder shot = ShotFolder.open(SmallShot.in(folder).folder());
        try (Lanes lanes = new Lanes(1)) {
            SimulateWork.run(shot, ShotCheck.requireForNotes(shot), lanes, Progress.SILENT, new Cancel());
        }
        return folder;
    }

    /** Takes up a hand and waits for its picture. */
    void takeUp(Hand hand) {
        onSwing(() -> {
            desk.look(s -> s.withHand(hand));
            if (tool != null) {
                tool.leave();
            }
            tool = Tools.of(hand, desk, retouching, this);
        });
        await("the picture is there", retouching::isAtRest);
    }

    static Pointer at(double x, double y) {
        return at(x, y, "");
    }

    /** A pointer at a place of the picture, in heights. @param keys of "shift", "ctrl", "alt" */
    static Pointer at(double x, double y, String keys) {
        return new Pointer(new Point(x, y), PLACE.left() + PLACE.scale() * x, PLACE.top() + PLACE.scale() * y, 1, keys.contains("shift"),
                keys.contains("ctrl"), keys.contains("alt"), 1 / PLACE.scale());
    }

    /** A drag along places (x, y, x, y, ...), each in an event of its own. */
    void drag(String keys, double... xy) {
        onSwing(() -> tool.pressed(at(xy[0], xy[1], keys)));
        for (int n = 2; n < xy.length; n += 2) {
            int k = n;
            onSwing(() -> tool.dragged(at(xy[k], xy[k + 1], keys)));
        }
        onSwing(() -> tool.released(at(xy[xy.length - 2], xy[xy.length - 1], keys)));
    }

    void click(String keys, double x, double y) {
        drag(keys, x, y);
    }

    /** What the tool draws over nothing. */
    BufferedImage painted() {
        return DeskDriver.onSwing(() -> {
            BufferedImage image = new BufferedImage(440, 520, BufferedImage.TYPE_INT_ARGB);
            tool.paint(image.createGraphics(), PLACE);
            return image;
        });
    }

    /** How many pixels within some of a place the tool draws on. */
    int paintedNear(double x, double y, int pixels) {
        BufferedImage image = painted();
        int count = 0;
        for (int dy = -pixels; dy <= pixels; dy++) {
            for (int dx = -pixels; dx <= pixels; dx++) {
                int px = (int) (PLACE.left() + PLACE.scale() * x) + dx;
                int py = (int) (PLACE.top() + PLACE.scale() * y) + dy;
                boolean there = px >= 0 && py >= 0 && px < image.getWidth() && py < image.getHeight();
                count += there && image.getRGB(px, py) >>> 24 != 0 ? 1 : 0;
            }
        }
        return count;
    }

    void await(String what, Callable<Boolean> wished) {
        long end = System.nanoTime() + MOST_SECONDS * 1_000_000_000L;
        while (!DeskDriver.onSwing(wished)) {
            if (System.nanoTime() > end) {
                throw new AssertionError("waited " + MOST_SECONDS + " s and it is still not so: " + what);
            }
            try {
                Thread.sleep(5);
            } catch (InterruptedException stop) {
                throw new IllegalStateException(stop);
            }
        }
    }

    void rest() {
        await("at rest", retouching::isAtRest);
    }

    static void onSwing(Runnable task) {
        DeskDriver.onSwing(() -> {
            task.run();
            return null;
        });
    }

    @Override
    public void showLive(Picture picture) {
        live = picture;
    }

    @Override
    public void changed(Window pixels) {
        windows.add(pixels);
    }

    @Override
    public void overlayChanged(int x, int y, int width, int height) {
        overlays++;
    }

    @Override
    public void overlayChanged() {
        overlays++;
    }

    @Override
    public Placement placement() {
        return PLACE;
    }

    @Override
    public void close() {
        onSwing(() -> {
            if (tool != null) {
                tool.leave();
            }
            while (!desk.state().history().made().isEmpty()) {
                desk.undo();
            }
        });
        await("all is on disk", () -> desk.state().saving().isDone());
        onSwing(desk::close);
    }
}
