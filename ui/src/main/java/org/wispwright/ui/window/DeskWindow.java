package org.wispwright.ui.window;

import java.awt.BorderLayout;
import java.awt.CardLayout;
import java.awt.Dimension;
import java.awt.GraphicsDevice;
import java.awt.GraphicsEnvironment;
import java.awt.Rectangle;
import java.awt.event.WindowAdapter;
import java.awt.event.WindowEvent;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CountDownLatch;
import java.util.function.UnaryOperator;
import javax.swing.BorderFactory;
import javax.swing.JFrame;
import javax.swing.JPanel;
import javax.swing.JSplitPane;
import javax.swing.SwingUtilities;
import javax.swing.UIManager;
import javax.swing.WindowConstants;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Memory;
import org.wispwright.ui.desk.Remembered;
import org.wispwright.ui.desk.Workers;
import org.wispwright.ui.window.easel.EaselPanel;
import org.wispwright.ui.window.notes.NotesPanel;
import org.wispwright.ui.window.ribbon.RibbonPanel;
import org.wispwright.ui.window.start.BeginPanel;
import org.wispwright.ui.window.start.GuideStrip;
import org.wispwright.ui.window.start.StartPanel;
import org.wispwright.ui.window.takes.TakesPanel;

/** The one window: notes, easel and takes side by side, the frames below, a line of words above. Swing's thread. */
public final class DeskWindow {
    /** The smallest window in which everything can be reached. */
    public static final Dimension SMALLEST = new Dimension(1024, 700);
    private static final Dimension USUAL = new Dimension(1440, 900);
    private static final int SIDE = 250;
    /** Of the sides' and the easel's width, what stays however narrow the window and large the words. */
    private static final int LEAST_SIDE = 200;
    /** A side with large words has more width, but leaves a third of the smallest window to the easel. */
    private static final int MOST_SIDE = 330;

    private final Desk desk;
    private final Memory memory;
    private final JFrame frame = new JFrame(Words.of("window.title"));
    private final JPanel cards = new JPanel(new CardLayout());
    private final ActionTable actions;
    private final TakesPanel takes;
    private final BeginPanel beginning;
    private boolean begins;
    private Optional<Path> opened = Optional.empty();
    private Runnable closed = () -> { };

    /** Builds the window round a desk; {@link #show} opens it. */
    public DeskWindow(Desk desk, Memory memory) {
        this.desk = desk;
        this.memory = memory;
        actions = new ActionTable(desk, frame.getRootPane());
        NotesPanel notes = new NotesPanel(desk);
        EaselPanel easel = new EaselPanel(desk, EaselPanel.retouching(desk), () -> actions.get("note.new").actionPerformed(null));
        takes = new TakesPanel(desk);
        RibbonPanel ribbon = new RibbonPanel(desk);
        StartPanel start = new StartPanel(desk, memory, () -> begin(Optional.empty()));
        actions.add(new DeskActions(desk, this, memory).all());
        for (List<DeskAction> some : List.of(start.actions(), notes.actions(), easel.actions(), takes.actions(), ribbon.actions())) {
            actions.add(some);
        }
        JPanel work = new JPanel(new BorderLayout());
        JPanel above = new JPanel(new BorderLayout());
        GuideStrip guide = new GuideStrip(desk, memory, actions::get);
        actions.add(guide.actions());
        actions.refresh(desk.state());
        above.add(new TitleStrip(desk, actions), BorderLayout.NORTH);
        above.add(guide, BorderLayout.SOUTH);
        work.add(above, BorderLayout.NORTH);
        work.add(split(notes, split(easel, takes, 1), 0), BorderLayout.CENTER);
        work.add(ribbon, BorderLayout.SOUTH);
        int side = Math.min(MOST_SIDE, Math.round(SIDE * UIManager.getFont("defaultFont").getSize2D() / 13));
        notes.setPreferredSize(new Dimension(side, 0));
        takes.setPreferredSize(new Dimension(side, 0));
        for (JPanel part : List.of(notes, easel, takes)) {
            part.setMinimumSize(new Dimension(part == easel ? LEAST_SIDE : Math.min(side, LEAST_SIDE * side / SIDE), 0));
        }
        cards.add(start, "start");
        cards.add(work, "work");
        beginning = new BeginPanel(desk, () -> {
            begins = false;
            follow(desk.state());
        });
        cards.add(beginning, "begin");
        frame.setContentPane(cards);
        frame.setJMenuBar(Menus.of(actions));
        frame.setMinimumSize(SMALLEST);
        frame.setDefaultCloseOperation(WindowConstants.DO_NOTHING_ON_CLOSE);
        frame.addWindowListener(new WindowAdapter() {
            @Override
            public void windowClosing(WindowEvent e) {
                close();
            }
        });
        frame.getRootPane().setTransferHandler(new Dropped(desk, this::begin));
        desk.listen(this::follow);
    }

    private static JSplitPane split(java.awt.Component left, java.awt.Component right, double weight) {
        JSplitPane pane = new JSplitPane(JSplitPane.HORIZONTAL_SPLIT, true, left, right);
        pane.setResizeWeight(weight);
        pane.setBorder(BorderFactory.createEmptyBorder());
        return pane;
    }

    private void follow(DeskState state) {
        Optional<Path> now = state.shot().map(s -> s.folder().root());
        if (!now.equals(opened)) {
            opened = now;
            now.ifPresent(path -> memory.change(m -> m.opened(path)));
        }
        ((CardLayout) cards.getLayout()).show(cards, begins ? "begin" : state.shot().isPresent() ? "work" : "start");
        frame.setTitle(state.shot().map(s -> Words.of("window.title.shot", s.setup().name())).orElse(Words.of("window.title")));
    }

    /** Opens the guided set-up. @param frames a folder of frames to begin with */
    void begin(Optional<Path> frames) {
        begins = true;
        frames.ifPresent(beginning::framesIn);
        follow(desk.state());
    }

    /** The frame itself. */
    public JFrame frame() {
        return frame;
    }

    /** Everything that can be done. */
    public ActionTable actions() {
        return actions;
    }

    /** Opens the window where it was last. */
    public void show() {
        frame.setSize(USUAL);
        frame.setLocationByPlatform(memory.now().window().isEmpty());
        memory.now().window().ifPresent(w -> frame.setBounds(onScreen(new Rectangle(w.get(0), w.get(1), w.get(2), w.get(3)))));
        frame.setVisible(true);
    }

    /** A remembered place, unless its screen is gone. */
    private static Rectangle onScreen(Rectangle wished) {
        for (GraphicsDevice screen : GraphicsEnvironment.getLocalGraphicsEnvironment().getScreenDevices()) {
            Rectangle there = screen.getDefaultConfiguration().getBounds().intersection(wished);
            if (there.width >= SMALLEST.width / 2 && there.height >= SMALLEST.height / 2) {
                return wished;
            }
        }
        return new Rectangle(0, 0, USUAL.width, USUAL.height);
    }

    /** Another theme or size of text: the window is built anew round the same session. */
    void renew(UnaryOperator<Remembered> change) {
        memory.change(change);
        Rectangle bounds = frame.getBounds();
        desk.forgetListeners();
        frame.dispose();
        Palette.use(memory.now().dark(), memory.now().textScale());
        DeskWindow next = new DeskWindow(desk, memory);
        next.closed = closed;
        next.frame.setBounds(bounds);
        next.frame.setVisible(true);
    }

    /** Closes the window and the session; while a solve runs, once the person has said what becomes of it. */
    public void close() {
        if (takes.mayClose(this::close)) {
            end();
        }
    }

    /** Closes the window and the session, whatever runs. */
    void end() {
        Rectangle b = frame.getBounds();
        memory.change(m -> m.ended(List.of(b.x, b.y, b.width, b.height)));
        frame.dispose();
        desk.close();
        closed.run();
    }

    /**
     * Opens the desk and waits until it is closed. Not on Swing's thread.
     *
     * @param folder a shot to open; empty for none
     */
    public static void runUntilClosed(Optional<Path> folder) {
        System.setProperty("apple.laf.useScreenMenuBar", "true");             // menus where the platform has them; read before Swing starts
        CountDownLatch ended = new CountDownLatch(1);
        SwingUtilities.invokeLater(() -> {
            Memory memory = new Memory(Memory.usual());
            Palette.use(memory.now().dark(), memory.now().textScale());
            DeskWindow window = new DeskWindow(new Desk(new Workers(SwingUtilities::invokeLater)), memory);
            window.closed = ended::countDown;
            window.show();
            folder.ifPresent(window.desk::open);
        });
        try {
            ended.await();
        } catch (InterruptedException stop) {
            Thread.currentThread().interrupt();
        }
    }
}
