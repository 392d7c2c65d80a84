package org.wispwright.ui.window.start;

import java.awt.Component;
import java.awt.Dimension;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import javax.swing.JButton;
import javax.swing.JFileChooser;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.SwingConstants;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Memory;
import org.wispwright.ui.desk.Message;
import org.wispwright.ui.job.SampleWork;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** What a person sees before there is a shot: ways in, the shots of the last days, and what the tool is not for. */
public final class StartPanel extends JPanel {
    private static final int WIDE = 460;

    private final Desk desk;
    private final Memory memory;
    private final Runnable begin;
    private final JPanel recent = new JPanel(new MigLayout("insets 0, wrap 1, fillx, gapy 4", "[grow, fill]"));
    private final JPanel left = new JPanel(new MigLayout("insets 0, wrap 1, fillx, gapy 4", "[grow, fill]"));
    private final JLabel said = new JLabel();

    /** Follows a desk. @param begin opens the guided set-up */
    public StartPanel(Desk desk, Memory memory, Runnable begin) {
        super(new MigLayout("insets 32, wrap 1, align center center, hidemode 3", "[" + WIDE + "!, fill]"));
        this.desk = desk;
        this.memory = memory;
        this.begin = begin;
        setName("start");
        getAccessibleContext().setAccessibleName(Words.of("start.name"));
        JLabel title = new JLabel(Words.of("start.name"));
        title.setFont(Palette.strong());
        add(title);
        add(words("start.job", "start-job", false), "gapbottom 16");
        add(left, "gapbottom 16");
        add(way("shot.open", this::choose));
        add(way("shot.begin", begin));
        add(way("shot.sample", this::trySample));
        said.setName("start-message");
        said.setForeground(Palette.FAULT.colour());
        add(said, "gaptop 8");
        add(recent, "gaptop 16");
        add(words("start.caution", "start-caution", true), "gaptop 24");
        listRecent();
        whatWasLeft(memory.now().open());
        desk.listen(this::follow);
    }

    private static JLabel words(String key, String name, boolean quiet) {
        JLabel label = new JLabel("<html><div style='width:" + WIDE * 3 / 4 + "px'>" + Words.of(key) + "</div></html>");
        label.setName(name);
        if (quiet) {
            label.setForeground(Palette.QUIET.colour());
            label.setFont(Palette.small());
        }
        return label;
    }

    private static JButton way(String action, Runnable run) {
        JButton button = new JButton(Words.of("action." + action));
        button.setName("start-" + action.substring(action.indexOf('.') + 1));
        button.setToolTipText(Words.of("action." + action + ".tip"));
        button.setHorizontalAlignment(SwingConstants.LEFT);
        button.setPreferredSize(new Dimension(WIDE, 10 * Palette.STEP));
        button.addActionListener(e -> run.run());
        return button;
    }

    /** An earlier desk did not end by itself: says that nothing is lost, and offers to go on. */
    private void whatWasLeft(Optional<Path> open) {
        open.filter(Files::isDirectory).ifPresent(shot -> {
            JLabel words = new JLabel("<html><div style='width:" + WIDE * 3 / 4 + "px'>" + Words.of("start.left", shot.getFileName())
                    + "</div></html>");
            words.setName("start-left");
            left.add(words);
            JButton again = way("shot.again", () -> desk.open(shot));
            left.add(again);
        });
        left.setVisible(left.getComponentCount() > 0);
    }

    /** What can be done here. */
    public List<DeskAction> actions() {
        return List.of(DeskAction.always("shot.open", "ctrl O", this::choose),
                DeskAction.always("shot.begin", "ctrl N", begin), DeskAction.always("shot.sample", null, this::trySample));
    }

    private void choose() {
        JFileChooser chooser = new JFileChooser();
        chooser.setName("choose-shot");
        chooser.setDialogTitle(Words.of("action.shot.open"));
        chooser.setFileSelectionMode(JFileChooser.DIRECTORIES_ONLY);
        memory.now().recent().stream().findFirst().map(Path::getParent).ifPresent(p -> chooser.setCurrentDirectory(p.toFile()));
        if (chooser.showOpenDialog(this) == JFileChooser.APPROVE_OPTION) {
            desk.open(chooser.getSelectedFile().toPath());
        }
    }

    private void trySample() {
        Path below = Path.of(System.getProperty("user.home", "."), "Wispwright");
        desk.workers().lane("sample").execute(() -> {
            try {
                Path copy = SampleWork.copyBelow(below);
                desk.workers().onDesk(() -> desk.open(copy));
            } catch (RuntimeException refused) {
                desk.workers().onDesk(() -> desk.say(Message.Kind.FAULT, Desk.words(refused)));
            }
        });
    }

    private void follow(DeskState state) {
        said.setText(state.shot().isPresent() ? "" : state.message().map(m -> "<html><div style='width:" + WIDE * 3 / 4 + "px'>"
                + m.words().replace("<", "&lt;") + "</div></html>").orElse(""));
    }

    /** The shots that are still there. */
    private void listRecent() {
        List<Path> there = memory.now().recent().stream().filter(p -> Files.isDirectory(p)).toList();
        if (!there.isEmpty()) {
            JLabel title = new JLabel(Words.of("start.recent"));
            title.setFont(Palette.small());
            recent.add(title);
        }
        there.forEach(shot -> recent.add(link(shot)));
    }

    private Component link(Path shot) {
        JButton button = new JButton(shot.getFileName() + "   " + shot.getParent());
        button.setName("recent-" + shot.getFileName());
        button.getAccessibleContext().setAccessibleName(Words.of("start.recent.open", shot));
        button.setToolTipText(Words.of("start.recent.open", shot));
        button.setHorizontalAlignment(SwingConstants.LEFT);
        button.putClientProperty("JButton.buttonType", "borderless");
        button.setFont(Palette.small());
        button.setMinimumSize(new Dimension(0, 0));
        button.addActionListener(e -> desk.open(shot));
        return button;
    }
}
