package org.wispwright.ui.window;

import java.awt.BorderLayout;
import java.awt.CardLayout;
import java.awt.Dimension;
import java.awt.event.WindowAdapter;
import java.awt.event.WindowEvent;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CountDownLatch;
import javax.swing.BorderFactory;
import javax.swing.JFrame;
import javax.swing.JPanel;
import javax.swing.JSplitPane;
import javax.swing.SwingUtilities;
import javax.swing.WindowConstants;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Workers;
import org.wispwright.ui.window.easel.EaselPanel;
import org.wispwright.ui.window.notes.NotesPanel;
import org.wispwright.ui.window.ribbon.RibbonPanel;
import org.wispwright.ui.window.start.StartPanel;
import org.wispwright.ui.window.takes.TakesPanel;

/** The one window: notes, easel and takes side by side, the frames below, a line of words above. Swing's thread. */
public final class DeskWindow {
    /** The smallest window in which everything can be reached. */
    public static final Dimension SMALLEST = new Dimension(1024, 700);
    private static final int SIDE = 250;

    private final Desk desk;
    private final JFrame frame = new JFrame(Words.of("window.title"));
    private final JPanel cards = new JPanel(new CardLayout());
    private final ActionTable actions;
    private Runnable closed = () -> { };

    /** Builds the window round a desk; {@link #show} opens it. */
    public DeskWindow(Desk desk) {
        this.desk = desk;
        actions = new ActionTable(desk, frame.getRootPane());
        NotesPanel notes = new NotesPanel(desk);
        EaselPanel easel = new EaselPanel(desk);
        TakesPanel takes = new TakesPanel(desk);
        RibbonPanel ribbon = new RibbonPanel(desk);
        StartPanel start = new StartPanel(desk);
        actions.add(new DeskActions(desk, this).all());
        for (List<DeskAction> some : List.of(start.actions(), notes.actions(), easel.actions(), takes.actions(), ribbon.actions())) {
            actions.add(some);
        }
        actions.refresh(desk.state());
        JPanel work = new JPanel(new BorderLayout());
        work.add(new TitleStrip(desk, actions), BorderLayout.NORTH);
        work.add(split(notes, split(easel, takes, 1), 0), BorderLayout.CENTER);
        work.add(ribbon, BorderLayout.SOUTH);
        notes.setPreferredSize(new Dimension(SIDE, 0));
        takes.setPreferredSize(new Dimension(SIDE, 0));
        cards.add(start, "start");
        cards.add(work, "work");
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
        desk.listen(this::follow);
    }

    private static JSplitPane split(java.awt.Component left, java.awt.Component right, double weight) {
        JSplitPane pane = new JSplitPane(JSplitPane.HORIZONTAL_SPLIT, true, left, right);
        pane.setResizeWeight(weight);
        pane.setBorder(BorderFactory.createEmptyBorder());
        return pane;
    }

    private void follow(DeskState state) {
        ((CardLayout) cards.getLayout()).show(cards, state.shot().isPresent() ? "work" : "start");
        frame.setTitle(state.shot().map(s -> Words.of("window.title.shot", s.setup().name())).orElse(Words.of("window.title")));
    }

    /** The frame itself. */
    public JFrame frame() {
        return frame;
    }

    /** Everything that can be done. */
    public ActionTable actions() {
        return actions;
    }

    /** Opens the window. */
    public void show() {
        frame.setSize(new Dimension(1440, 900));
        frame.setVisible(true);
    }

    /** Closes the window and the session. */
    public void close() {
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
        CountDownLatch ended = new CountDownLatch(1);
        SwingUtilities.invokeLater(() -> {
            Palette.use(true, 1);
            Desk desk = new Desk(new Workers(SwingUtilities::invokeLater));
            DeskWindow window = new DeskWindow(desk);
            window.closed = ended::countDown;
            window.show();
            folder.ifPresent(desk::open);
        });
        try {
            ended.await();
        } catch (InterruptedException stop) {
            Thread.currentThread().interrupt();
        }
    }
}
