package org.wispwright.ui.window;

import java.awt.AWTEvent;
import java.awt.AWTException;
import java.awt.Component;
import java.awt.Container;
import java.awt.Dimension;
import java.awt.Point;
import java.awt.Rectangle;
import java.awt.Robot;
import java.awt.Toolkit;
import java.awt.Window;
import java.awt.event.AWTEventListener;
import java.awt.event.InputEvent;
import java.awt.event.KeyEvent;
import java.awt.event.MouseEvent;
import java.awt.event.MouseWheelEvent;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.Callable;
import java.util.concurrent.FutureTask;
import java.util.function.Predicate;
import javax.imageio.ImageIO;
import javax.swing.JMenuItem;
import javax.swing.KeyStroke;
import javax.swing.SwingUtilities;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Memory;
import org.wispwright.ui.desk.Workers;
import org.wispwright.ui.window.easel.EaselProbe;

/**
 * Works the desk as a person does: finds components by their names, moves the pointer, clicks, drags and types with real events on the
 * toolkit's screen, and waits for what comes of it. One at a time; close it.
 */
public final class DeskDriver implements AutoCloseable {
    private static final long MOST_SECONDS = 120;

    private static final long MOST_SECONDS_TO_ARRIVE = 5;

    private final Robot robot;
    private final Map<Integer, Integer> seen = new HashMap<>();
    private final AWTEventListener counting = this::see;
    private final Desk desk;
    private final DeskWindow window;

    /** Opens an empty desk in a window of a size. */
    public DeskDriver(Dimension size) {
        this(size, true, 1);
    }

    /** Opens an empty desk that remembers nothing. @param dark the theme @param textScale 1 is usual */
    public DeskDriver(Dimension size, boolean dark, double textScale) {
        this(size, new Memory(forgotten()), dark, textScale);
    }

    /** Opens an empty desk. @param memory what it remembers @param dark the theme @param textScale 1 is usual */
    public DeskDriver(Dimension size, Memory memory, boolean dark, double textScale) {
        try {
            robot = new Robot();
        } catch (AWTException none) {
            throw new IllegalStateException(none);
        }
        robot.setAutoDelay(2);
        Toolkit.getDefaultToolkit().addAWTEventListener(counting, AWTEvent.KEY_EVENT_MASK | AWTEvent.MOUSE_EVENT_MASK);
        Object[] made = onSwing(() -> {
            Palette.use(dark, textScale);
            Desk d = new Desk(new Workers(SwingUtilities::invokeLater));
            DeskWindow w = new DeskWindow(d, memory);
            w.frame().setSize(size);
            w.frame().setLocation(0, 0);
            w.frame().setVisible(true);
            return new Object[] {d, w};
        });
        desk = (Desk) made[0];
        window = (DeskWindow) made[1];
        robot.waitForIdle();
    }

    /** A file that nothing is remembered in; gone after the test run. */
    private static Path forgotten() {
        try {
            Path folder = Files.createTempDirectory("desk");
            folder.toFile().deleteOnExit();
            Path file = folder.resolve("desk.properties");
            file.toFile().deleteOnExit();
            return file;
        } catch (IOException refused) {
            throw new UncheckedIOException(refused);
        }
    }

    /** Counts the robot's events as they are seen to: the toolkit's robot returns before they are. */
    private void arrive(int event, Runnable act) {
        int before = seen(event);
        act.run();
        long end = System.nanoTime() + MOST_SECONDS_TO_ARRIVE * 1_000_000_000L;
        while (seen(event) == before && System.nanoTime() < end) {
            robot.delay(2);
        }
        onSwing(() -> null);
        robot.waitForIdle();
    }

    private int seen(int event) {
        synchronized (seen) {
            return seen.getOrDefault(event, 0);
        }
    }

    private void see(AWTEvent event) {
        synchronized (seen) {
            seen.merge(event.getID(), 1, Integer::sum);
        }
    }

    /** Opens a shot and waits until it lies on the desk. */
    public DeskDriver open(Path folder) {
        doOnSwing(() -> desk.open(folder));
        await("the shot is open", s -> s.shot().isPresent());
        return this;
    }

    /** The window. */
    public DeskWindow window() {
        return window;
    }

    /** The desk; its methods belong to Swing's thread. */
    public Desk desk() {
        return desk;
    }

    /** The state of this moment. */
    public DeskState state() {
        return onSwing(desk::state);
    }

    /** Waits until the state is as it should be. */
    public void await(String what, Predicate<DeskState> wished) {
        awaitTrue(what, () -> wished.test(desk.state()));
    }

    /** Waits until something holds, asked on Swing's thread. @throws AssertionError if it does not come */
    public void awaitTrue(String what, Callable<Boolean> wished) {
        long end = System.nanoTime() + MOST_SECONDS * 1_000_000_000L;
        while (!onSwing(wished)) {
            if (System.nanoTime() > end) {
                throw new AssertionError("waited " + MOST_SECONDS + " s and it is still not so: " + what + "; message: "
                        + state().message());
            }
            robot.delay(10);
        }
        robot.waitForIdle();
    }

    /** The showing component of that name, in any window. @throws AssertionError if there is none */
    public <T extends Component> T find(String name, Class<T> kind) {
        return onSwing(() -> {
            List<Component> all = new ArrayList<>();
            for (Window w : Window.getWindows()) {
                if (w.isShowing()) {
                    collect(w, all);
                }
            }
            return all.stream().filter(c -> name.equals(c.getName()) && kind.isInstance(c) && c.isShowing()).map(kind::cast).findFirst()
                    .orElseThrow(() -> new AssertionError("no showing component named '" + name + "'"));
        });
    }

    /** Every component of the window, shown or not. */
    public List<Component> everything() {
        return onSwing(() -> {
            List<Component> all = new ArrayList<>();
            collect(window.frame(), all);
            return all;
        });
    }

    private static void collect(Component c, List<Component> all) {
        all.add(c);
        if (c instanceof Container container) {
            for (Component child : container.getComponents()) {
                collect(child, all);
            }
        }
    }

    /** Clicks the middle of a component. */
    public void click(String name) {
        Component c = find(name, Component.class);
        clickAt(onScreen(c, 0.5, 0.5));
    }

    /** Clicks at a place on the screen. */
    public void clickAt(Point p) {
        robot.mouseMove(p.x, p.y);
        arrive(MouseEvent.MOUSE_PRESSED, () -> robot.mousePress(InputEvent.BUTTON1_DOWN_MASK));
        arrive(MouseEvent.MOUSE_RELEASED, () -> robot.mouseRelease(InputEvent.BUTTON1_DOWN_MASK));
    }

    /** Moves the pointer there. */
    public void moveTo(Point p) {
        robot.mouseMove(p.x, p.y);
        robot.waitForIdle();
    }

    /** Turns the wheel over a component. The toolkit's robot has no wheel, so the event is posted. @param notches below 0 away from the hand */
    public void wheel(Component c, double x, double y, int notches) {
        Point corner = onScreen(c, 0, 0);
        Point p = onScreen(c, x, y);
        moveTo(p);
        Toolkit.getDefaultToolkit().getSystemEventQueue().postEvent(new MouseWheelEvent(c, MouseEvent.MOUSE_WHEEL,
                System.currentTimeMillis(), 0, p.x - corner.x, p.y - corner.y, 0, false, MouseWheelEvent.WHEEL_UNIT_SCROLL, 1, notches));
        robot.waitForIdle();
    }

    /** Drags over places on the screen with the left button. */
    public void drag(List<Point> places) {
        robot.mouseMove(places.get(0).x, places.get(0).y);
        arrive(MouseEvent.MOUSE_PRESSED, () -> robot.mousePress(InputEvent.BUTTON1_DOWN_MASK));
        for (Point p : places.subList(1, places.size())) {
            robot.mouseMove(p.x, p.y);
            robot.waitForIdle();
        }
        arrive(MouseEvent.MOUSE_RELEASED, () -> robot.mouseRelease(InputEvent.BUTTON1_DOWN_MASK));
    }

    /** Lets the person look for a while. */
    public void pause(int millis) {
        robot.delay(millis);
        robot.waitForIdle();
    }

    /** Where a place of the picture lies on the screen. */
    public Point placeOnEasel(org.wispwright.warp.matte.Point place) {
        return EaselProbe.onScreen(find("easel-picture", Component.class), place);
    }

    /** True if the hand's own picture is on the easel. Swing's thread. */
    public boolean hasLivePicture() {
        return EaselProbe.hasLive(find("easel-picture", Component.class));
    }

    /** A place in a component on the screen. @param x share of its width @param y share of its height */
    public Point onScreen(Component c, double x, double y) {
        return onSwing(() -> {
            Point corner = c.getLocationOnScreen();
            return new Point(corner.x + (int) Math.round(x * (c.getWidth() - 1)), corner.y + (int) Math.round(y * (c.getHeight() - 1)));
        });
    }

    /** Presses a key with its modifiers, such as "ctrl Z". */
    public void key(String stroke) {
        KeyStroke key = KeyStroke.getKeyStroke(stroke);
        int[] modifiers = {InputEvent.CTRL_DOWN_MASK, InputEvent.SHIFT_DOWN_MASK, InputEvent.ALT_DOWN_MASK};
        int[] codes = {KeyEvent.VK_CONTROL, KeyEvent.VK_SHIFT, KeyEvent.VK_ALT};
        for (int n = 0; n < codes.length; n++) {
            if ((key.getModifiers() & modifiers[n]) != 0) {
                robot.keyPress(codes[n]);
            }
        }
        arrive(KeyEvent.KEY_PRESSED, () -> robot.keyPress(key.getKeyCode()));
        arrive(KeyEvent.KEY_RELEASED, () -> robot.keyRelease(key.getKeyCode()));
        for (int n = codes.length - 1; n >= 0; n--) {
            if ((key.getModifiers() & modifiers[n]) != 0) {
                robot.keyRelease(codes[n]);
            }
        }
        robot.waitForIdle();
    }

    /** Types plain letters, digits and spaces where the focus is. */
    public void type(String text) {
        for (char c : text.toCharArray()) {
            boolean upper = Character.isUpperCase(c);
            if (upper) {
                robot.keyPress(KeyEvent.VK_SHIFT);
            }
            int code = KeyEvent.getExtendedKeyCodeForChar(c);
            arrive(KeyEvent.KEY_PRESSED, () -> robot.keyPress(code));
            arrive(KeyEvent.KEY_RELEASED, () -> robot.keyRelease(code));
            if (upper) {
                robot.keyRelease(KeyEvent.VK_SHIFT);
            }
        }
        robot.waitForIdle();
    }

    /** Does an action by its menu item, without opening the menu. @throws AssertionError if it is not enabled */
    public void act(String id) {
        doOnSwing(() -> {
            JMenuItem item = new JMenuItem(window.actions().get(id));
            if (!item.isEnabled()) {
                throw new AssertionError("the action '" + id + "' is not enabled");
            }
            item.doClick(0);
        });
        robot.waitForIdle();
    }

    /** What the window looks like now. */
    public BufferedImage screenshot() {
        robot.waitForIdle();
        Rectangle bounds = onSwing(() -> window.frame().getBounds());
        return robot.createScreenCapture(bounds);
    }

    /** What a component paints now. */
    public BufferedImage screenshotOf(Component c) {
        return onSwing(() -> {
            BufferedImage image = new BufferedImage(c.getWidth(), c.getHeight(), BufferedImage.TYPE_INT_RGB);
            c.paint(image.createGraphics());
            return image;
        });
    }

    /** Writes what the window looks like into {@code target/screens}, for people. */
    public void keepScreenshot(String name) {
        try {
            Path folder = Files.createDirectories(Path.of("target", "screens"));
            ImageIO.write(screenshot(), "png", folder.resolve(name + ".png").toFile());
        } catch (IOException refused) {
            throw new UncheckedIOException(refused);
        }
    }

    /** Runs on Swing's thread and waits for it. */
    public void doOnSwing(Runnable task) {
        onSwing(() -> {
            task.run();
            return null;
        });
    }

    /** Asks on Swing's thread and waits for the answer. */
    public static <T> T onSwing(Callable<T> task) {
        FutureTask<T> future = new FutureTask<>(task);
        if (SwingUtilities.isEventDispatchThread()) {
            future.run();
        } else {
            SwingUtilities.invokeLater(future);
        }
        try {
            return future.get();
        } catch (InterruptedException stop) {
            throw new IllegalStateException(stop);
        } catch (java.util.concurrent.ExecutionException thrown) {
            if (thrown.getCause() instanceof RuntimeException ours) {
                throw ours;
            }
            if (thrown.getCause() instanceof Error error) {
                throw error;
            }
            throw new IllegalStateException(thrown.getCause());
        }
    }

    /** Closes the window and everything that it opened. */
    @Override
    public void close() {
        Toolkit.getDefaultToolkit().removeAWTEventListener(counting);
        doOnSwing(window::end);
        doOnSwing(() -> {
            for (Window w : Window.getWindows()) {
                w.dispose();
            }
        });
    }
}
