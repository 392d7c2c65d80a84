package org.wispwright.ui.window.easel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.AWTEvent;
import java.awt.BorderLayout;
import java.awt.Component;
import java.awt.Container;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.Point;
import java.awt.Robot;
import java.awt.Toolkit;
import java.awt.Window;
import java.awt.event.AWTEventListener;
import java.awt.event.InputEvent;
import java.awt.event.KeyEvent;
import java.awt.event.MouseEvent;
import java.awt.image.BufferedImage;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import java.util.function.Function;
import javax.accessibility.Accessible;
import javax.imageio.ImageIO;
import javax.swing.AbstractButton;
import javax.swing.JButton;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JDialog;
import javax.swing.JFrame;
import javax.swing.JLabel;
import javax.swing.JList;
import javax.swing.JPanel;
import javax.swing.JPopupMenu;
import javax.swing.JSpinner;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.DeskDriver;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Stroke;
import org.wispwright.warp.retouch.WarpKind;

/** The strip under the picture, and the keyboard's pointer, in a window of their own with real events. Expectations: ours. */
class HandStripTest {
    @TempDir
    private static Path folder;
    private ToolBench bench;
    private Robot robot;
    private JFrame frame;
    private HandStrip strip;
    private JPanel canvas;
    private KeyPointer keys;
    private int newNotes;
    private int releases;
    /** Counts what really came: under load the robot may be idle before its events have reached Swing. */
    private final AWTEventListener counter = e -> releases += e.getID() == MouseEvent.MOUSE_RELEASED || e.getID() == KeyEvent.KEY_RELEASED
            ? 1 : 0;

    @BeforeAll
    static void shot() {
        ToolBench.shotIn(folder);
    }

    @BeforeEach
    void open() throws Exception {
        bench = new ToolBench(folder);
        robot = new Robot();
        Toolkit.getDefaultToolkit().addAWTEventListener(counter, AWTEvent.MOUSE_EVENT_MASK | AWTEvent.KEY_EVENT_MASK);
        window(true, 1000);
    }

    private void window(boolean dark, int width) {
        ToolBench.onSwing(() -> {
            if (frame != null) {
                frame.dispose();
            }
            Palette.use(dark, 1);
            strip = new HandStrip(bench.desk, bench.retouching, () -> newNotes++);
            canvas = new JPanel() {
                @Override
                protected void paintComponent(Graphics g) {
                    super.paintComponent(g);
                    if (bench.tool != null) {
                        bench.tool.paint((Graphics2D) g, ToolBench.PLACE);
                    }
                    keys.paint((Graphics2D) g, ToolBench.PLACE);
                }
            };
            canvas.setFocusable(true);
            canvas.setBackground(Palette.SURROUND.colour());
            keys = new KeyPointer(canvas, bench, () -> bench.tool, () -> !(bench.desk.state().hand() instanceof Hand.Looking),
                    strip::removeChosen);
            frame = new JFrame();
            frame.add(canvas, BorderLayout.CENTER);
            frame.add(strip, BorderLayout.SOUTH);
            frame.getContentPane().setPreferredSize(new Dimension(width, 600));
            frame.pack();
            frame.setLocation(0, 0);
            frame.setVisible(true);
        });
        robot.waitForIdle();
        bench.await("the window is laid out", () -> frame.isShowing() && strip.getHeight() > 0 && frame.isFocused());
    }

    @AfterEach
    void close() {
        Toolkit.getDefaultToolkit().removeAWTEventListener(counter);
        bench.close();
        ToolBench.onSwing(() -> {
            for (Window w : Window.getWindows()) {
                w.dispose();
            }
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

    private <T extends Component> Optional<T> seek(String name, Class<T> kind) {
        return DeskDriver.onSwing(() -> {
            List<Component> all = new ArrayList<>();
            for (Window w : Window.getWindows()) {
                collect(w, all);
            }
            return all.stream().filter(c -> name.equals(c.getName()) && c.isShowing()).map(kind::cast).findFirst();
        });
    }

    private <T extends Component> T find(String name, Class<T> kind) {
        bench.await("'" + name + "' is showing", () -> seek(name, kind).isPresent());
        return seek(name, kind).orElseThrow();
    }

    private void click(String name) {
        Component c = find(name, Component.class);
        Point at = DeskDriver.onSwing(() -> {
            Point corner = c.getLocationOnScreen();
            return new Point(corner.x + c.getWidth() / 2, corner.y + c.getHeight() / 2);
        });
        int before = DeskDriver.onSwing(() -> releases);
        robot.mouseMove(at.x, at.y);
        robot.mousePress(InputEvent.BUTTON1_DOWN_MASK);
        robot.mouseRelease(InputEvent.BUTTON1_DOWN_MASK);
        robot.waitForIdle();
        bench.await("the click came", () -> releases > before);
    }

    private void key(int... codes) {
        int before = DeskDriver.onSwing(() -> releases);
        for (int code : codes) {
            robot.keyPress(code);
        }
        for (int n = codes.length - 1; n >= 0; n--) {
            robot.keyRelease(codes[n]);
        }
        robot.waitForIdle();
        bench.await("the key came", () -> releases >= before + codes.length);
    }

    private void focusCanvas() {
        ToolBench.onSwing(canvas::requestFocusInWindow);
        bench.await("the picture has the focus", canvas::isFocusOwner);
    }

    private String text(String name) {
        return ask(name, JLabel.class, JLabel::getText);
    }

    private <T extends Component, R> R ask(String name, Class<T> kind, Function<T, R> question) {
        T found = find(name, kind);
        return DeskDriver.onSwing(() -> question.apply(found));
    }

    private void choose(String name, int index) {
        JComboBox<?> box = find(name, JComboBox.class);
        ToolBench.onSwing(() -> box.setSelectedIndex(index));
    }

    private Hand hand() {
        return DeskDriver.onSwing(() -> bench.desk.state().hand());
    }

    private void set(String name, Object value) {
        JSpinner spinner = find(name, JSpinner.class);
        ToolBench.onSwing(() -> spinner.setValue(value));
    }

    /** Writes what a component paints into {@code target/screens}, for people. */
    private void keep(Component c, String name) throws Exception {
        BufferedImage image = DeskDriver.onSwing(() -> {
            BufferedImage made = new BufferedImage(c.getWidth(), c.getHeight(), BufferedImage.TYPE_INT_RGB);
            c.paint(made.createGraphics());
            return made;
        });
        ImageIO.write(image, "png", Files.createDirectories(Path.of("target", "screens")).resolve(name + ".png").toFile());
    }

    @Test
    void everyHandHasAButtonThatTakesItUp() {
        for (HandKind kind : HandKind.values()) {
            click("hand-" + kind.word());
            assertEquals(kind, HandKind.of(hand()));
            assertEquals(kind.inWords(), text("hand-now"));
            assertTrue(ask("hand-" + kind.word(), AbstractButton.class, AbstractButton::isSelected));
        }
    }

    @Test
    void brushesShareTheirSettingsAndAHandComesBackAsItWasPutDown() {
        click("hand-add");
        set("hand-radius", 12.0);
        set("hand-strength", 35.0);
        set("hand-soft-edge", 20.0);
        assertEquals(new Hand.Brushing(Brush.ADD, 0.12, 0.35, 0.2, true), hand());
        click("hand-push");
        assertEquals(new Hand.Brushing(Brush.PUSH, 0.12, 0.35, 0.2, true), hand());
        click("hand-outline");
        set("hand-level", 45.0);
        set("hand-reach", 10.0);
        assertEquals(new Hand.Outlining(0.45, 0.1), hand());
        click("hand-hold");
        choose("hand-form", 2);
        set("hand-feather", 7.0);
        assertEquals(new Hand.Holding(Hand.Form.FREEHAND, 0.07), hand());
        click("hand-restore");
        assertEquals(new Hand.Brushing(Brush.RESTORE, 0.12, 0.35, 0.2, true), hand());
        click("hand-outline");
        assertEquals(new Hand.Outlining(0.45, 0.1), hand());
    }

    @Test
    void onlyTheSettingsOfTheHandAreThere() {
        click("hand-look");
        assertTrue(seek("hand-radius", JSpinner.class).isEmpty());
        click("hand-soften");
        assertTrue(seek("hand-radius", JSpinner.class).isPresent());
        assertTrue(seek("hand-mesh", JComboBox.class).isEmpty());
        click("hand-pull");
        assertTrue(seek("hand-radius", JSpinner.class).isEmpty());
        assertTrue(seek("hand-mesh", JComboBox.class).isPresent());
    }

    @Test
    void theKindOfTheMeshAtHandIsShownAndChanged() {
        click("hand-pull");
        bench.rest();
        assertEquals("" + WarpKind.SPLINE.ordinal(), ask("hand-mesh", JComboBox.class, box -> "" + box.getSelectedIndex()));
        choose("hand-mesh", WarpKind.RIGID.ordinal());
        assertEquals(WarpKind.RIGID, ((MeshWarp) bench.retouching.operations().get(0)).kind());
        assertEquals(Optional.of("Change mesh"), bench.desk.state().history().undoName());
        ToolBench.onSwing(bench.desk::undo);
        assertEquals("" + WarpKind.SPLINE.ordinal(), ask("hand-mesh", JComboBox.class, box -> "" + box.getSelectedIndex()));
    }

    @Test
    void whereThereIsNothingToWorkOnTheStripSaysSoAndHelps() {
        click("hand-remove");
        ToolBench.onSwing(() -> bench.desk.show(s -> s.withFrame(1002).withView("side")));
        robot.waitForIdle();
        assertEquals("The open note is about frame 1004 in view front.", text("hand-sentence"));
        assertTrue(seek("hand-radius", JSpinner.class).isEmpty());
        click("hand-help");
        assertTrue(bench.desk.state().isAtOpenNote());
        assertTrue(seek("hand-help", JButton.class).isEmpty());
        ToolBench.onSwing(() -> bench.desk.look(s -> s.withNote(Optional.empty())));
        robot.waitForIdle();
        assertEquals(Words.of("hand.noNote"), text("hand-sentence"));
        click("hand-help");
        assertEquals(1, newNotes);
    }

    @Test
    void framesOfAChosenHoldAreSetAndItIsRemoved() {
        bench.takeUp(new Hand.Holding(Hand.Form.RECTANGLE, 0.04));
        assertTrue(seek("hand-hold-first", JSpinner.class).isEmpty());
        bench.click("", 0.3, 0.9);
        robot.waitForIdle();
        set("hand-hold-last", 1006);
        set("hand-hold-first", 1002);
        var spans = bench.retouching.note().orElseThrow().holds().get(0).spans();
        assertEquals(1002, spans.get(0).first());
        assertEquals(1006, spans.get(0).last());
        assertEquals(Optional.of("Change frames of hold"), bench.desk.state().history().undoName());
        set("hand-hold-last", 1001);
        assertEquals(1001, bench.retouching.note().orElseThrow().holds().get(0).spans().get(0).first(), "the other end goes along");
        click("hand-remove-hold");
        assertTrue(bench.retouching.note().orElseThrow().holds().isEmpty());
        assertEquals(OptionalInt.empty(), bench.retouching.chosenHold());
    }

    @Test
    void stepsAreTakenOutAndPutInAnotherOrder() throws Exception {
        bench.takeUp(Hand.Brushing.usual(Brush.REMOVE));
        bench.drag("", 0.3, 0.7, 0.35, 0.72);
        bench.drag("", 0.3, 0.6, 0.35, 0.6);
        robot.waitForIdle();
        assertEquals("Steps: 3", ask("hand-steps", JButton.class, JButton::getText));
        click("hand-steps");
        JList<?> list = find("steps-list", JList.class);
        assertEquals("1   Mesh, 3 handles, spline", DeskDriver.onSwing(() -> list.getModel().getElementAt(0)));
        assertEquals(2, DeskDriver.onSwing(list::getSelectedIndex));
        keep(find("steps", Component.class), "steps-dark");
        click("steps-earlier");
        click("steps-earlier");
        assertTrue(bench.retouching.operations().get(0) instanceof Stroke);
        assertTrue(bench.retouching.operations().get(1) instanceof MeshWarp);
        assertEquals(0, DeskDriver.onSwing(list::getSelectedIndex));
        click("steps-remove");
        assertEquals(2, bench.retouching.operations().size());
        assertTrue(bench.retouching.operations().get(0) instanceof MeshWarp);
        bench.rest();
        JDialog dialog = find("steps", JDialog.class);
        bench.await("the list has the focus", dialog::isFocused);
        robot.keyPress(KeyEvent.VK_ESCAPE);                                    // it closes before the key comes up
        robot.keyRelease(KeyEvent.VK_ESCAPE);
        bench.await("the list is closed", () -> seek("steps", Component.class).isEmpty());
        action("hand.remove-last").run().run();
        assertEquals(1, bench.retouching.operations().size());
    }

    private DeskAction action(String id) {
        return strip.actions().stream().filter(a -> a.id().equals(id)).findFirst().orElseThrow();
    }

    @Test
    void everyActionHasWordsAndAKeyOfItsOwnAndWorks() {
        Set<Object> taken = new HashSet<>();
        for (DeskAction action : strip.actions()) {
            assertTrue(Words.has("action." + action.id()), action.id());
            assertTrue(action.key() == null || taken.add(action.key()), action.id());
        }
        ToolBench.onSwing(() -> {
            action("hand.lift").run().run();
            action("hand.wider").run().run();
            action("hand.weaker").run().run();
        });
        Hand.Brushing brushing = (Hand.Brushing) hand();
        assertEquals(Brush.LIFT, brushing.brush());
        assertEquals(0.06 * 1.15, brushing.radius(), 1e-12);
        assertEquals(0.55, brushing.strength(), 1e-12);
        for (org.wispwright.ui.desk.Retouching.Edit edit : org.wispwright.ui.desk.Retouching.Edit.values()) {
            assertFalse(Tools.inWords(edit).isEmpty());
        }
    }

    @Test
    void theMenuOfThePictureHasTheHands() {
        JPopupMenu menu = DeskDriver.onSwing(() -> strip.menu());
        assertEquals(HandKind.values().length, menu.getComponentCount());
        ToolBench.onSwing(() -> ((AbstractButton) menu.getComponent(HandKind.OUTLINE.ordinal())).doClick(0));
        assertEquals(HandKind.OUTLINE, HandKind.of(hand()));
    }

    /** WCAG 2.x, 4.1.2: every control has a name. */
    @Test
    void everyControlHasANameAndATip() {
        for (HandKind kind : HandKind.values()) {
            click("hand-" + kind.word());
            List<Component> all = DeskDriver.onSwing(() -> {
                List<Component> found = new ArrayList<>();
                collect(strip, found);
                return found;
            });
            for (Component c : all) {
                if (c.isShowing() && (c instanceof AbstractButton || c instanceof JSpinner || c instanceof JComboBox) && c.getName() != null
                        && c.getName().startsWith("hand-")) {
                    String name = ((Accessible) c).getAccessibleContext().getAccessibleName();
                    assertTrue(name != null && !name.isBlank(), c.getName());
                    assertTrue(((JComponent) c).getToolTipText() != null, c.getName());
                }
            }
        }
    }

    /** A stroke by keys alone: the pointer begins in the middle of the component, 500 of its pixels are one height. */
    @Test
    void aStrokeIsDrawnByKeysAlone() {
        bench.takeUp(new Hand.Brushing(Brush.REMOVE, 0.1, 0.7, 0.5, true));
        focusCanvas();
        key(KeyEvent.VK_LEFT);
        key(KeyEvent.VK_SHIFT, KeyEvent.VK_DOWN);
        assertEquals(1, bench.retouching.operations().size());
        key(KeyEvent.VK_SPACE);
        key(KeyEvent.VK_RIGHT);
        key(KeyEvent.VK_RIGHT);
        key(KeyEvent.VK_SHIFT, KeyEvent.VK_LEFT);
        key(KeyEvent.VK_ENTER);
        // The window is wider than the picture's place, so the middle lies beyond the picture's right border; the line is long enough.
        Hand.Brushing brush = (Hand.Brushing) hand();
        assertEquals(0.1, brush.radius());
        double x = (canvas.getWidth() / 2.0 - ToolBench.PLACE.left()) / 500 - 0.01;
        double y = (canvas.getHeight() / 2.0 - ToolBench.PLACE.top()) / 500 + 0.1;
        for (int n = 0; n < 5; n++) {
            key(KeyEvent.VK_SHIFT, KeyEvent.VK_LEFT);
        }
        key(KeyEvent.VK_SPACE);
        key(KeyEvent.VK_SHIFT, KeyEvent.VK_LEFT);
        key(KeyEvent.VK_SPACE);
        Stroke stroke = (Stroke) bench.retouching.operations().get(bench.retouching.operations().size() - 1);
        assertEquals(x + 0.02 - 0.6, stroke.line().get(0).x(), 1e-9);
        assertEquals(y, stroke.line().get(0).y(), 1e-9);
        assertEquals(x + 0.02 - 0.7, stroke.line().get(stroke.line().size() - 1).x(), 1e-9);
        int count = bench.retouching.operations().size();
        key(KeyEvent.VK_SPACE);
        key(KeyEvent.VK_SHIFT, KeyEvent.VK_RIGHT);
        key(KeyEvent.VK_ESCAPE);
        key(KeyEvent.VK_ENTER);
        assertEquals(count, bench.retouching.operations().size());
    }

    @Test
    void aHoldIsDrawnAndRemovedByKeysAlone() {
        bench.takeUp(new Hand.Holding(Hand.Form.RECTANGLE, 0));
        focusCanvas();
        key(KeyEvent.VK_SPACE);
        key(KeyEvent.VK_SHIFT, KeyEvent.VK_LEFT);
        key(KeyEvent.VK_SHIFT, KeyEvent.VK_UP);
        key(KeyEvent.VK_ENTER);
        assertEquals(2, bench.retouching.note().orElseThrow().holds().size());
        key(KeyEvent.VK_DELETE);
        assertEquals(1, bench.retouching.note().orElseThrow().holds().size());
    }

    /** Where a control ends, in the strip's pixels; 0 if it is not there. */
    private int right(String name) {
        return seek(name, JSpinner.class).map(c -> javax.swing.SwingUtilities.convertPoint(c, c.getWidth(), 0, strip).x).orElse(0);
    }

    @Test
    void picturesOfTheStripForPeople() throws Exception {
        for (boolean dark : new boolean[] {true, false}) {
            for (int width : new int[] {1000, 530}) {
                window(dark, width);
                int height = strip.getHeight();
                for (HandKind kind : List.of(HandKind.SOFTEN, HandKind.PULL, HandKind.OUTLINE, HandKind.HOLD)) {
                    bench.takeUp(kind.usual());
                    if (kind == HandKind.OUTLINE) {
                        bench.await("traced", () -> bench.retouching.outlines().isPresent());
                    }
                    ToolBench.onSwing(() -> bench.tool.moved(ToolBench.at(0.31, 0.8)));
                    robot.waitForIdle();
                    assertEquals(height, strip.getHeight(), "the picture must not jump");
                    assertTrue(right("hand-soft-edge") <= width, "the settings have room");
                    keep(frame.getContentPane(), "hand-" + kind.word() + (dark ? "-dark-" : "-light-") + width);
                }
                ToolBench.onSwing(() -> bench.desk.show(s -> s.withFrame(1002)));
                robot.waitForIdle();
                keep(strip, "hand-elsewhere" + (dark ? "-dark-" : "-light-") + width);
                assertEquals(height, strip.getHeight());
                ToolBench.onSwing(() -> bench.desk.show(s -> s.withFrame(1004)));
            }
        }
    }
}
