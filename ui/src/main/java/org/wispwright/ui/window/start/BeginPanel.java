package org.wispwright.ui.window.start;

import java.awt.CardLayout;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.SortedMap;
import java.util.TreeMap;
import javax.swing.JButton;
import javax.swing.JComponent;
import javax.swing.JFileChooser;
import javax.swing.JLabel;
import javax.swing.JPanel;
import net.miginfocom.swing.MigLayout;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Replacing;
import org.wispwright.ui.job.RetouchWork;
import org.wispwright.ui.shot.ShotDraft;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/**
 * The guided set-up: four short pages from a folder of frames, or a volume, to a shot. Every field has a value that works; the shot is made
 * and checked on a worker, and what is wrong with it is said on the page.
 */
public final class BeginPanel extends JPanel {
    private static final String[] PAGES = {"have", "box", "camera", "smoke"};

    private final Desk desk;
    private final Replacing looking;
    private final CardLayout turning = new CardLayout();
    private final JPanel pages = new JPanel(turning);
    private final JLabel page = new JLabel();
    private final JLabel said = new JLabel(" ");
    private final JButton back = new JButton(Words.of("begin.back"));
    private final JButton next = new JButton(Words.of("begin.next"));
    private final BeginFields fields = new BeginFields();
    private final Runnable left;
    private SortedMap<Integer, Path> frames = new TreeMap<>();
    private int at;

    /** The first page. @param left told when the person is done here */
    public BeginPanel(Desk desk, Runnable left) {
        super(new MigLayout("insets 24, wrap 1, align center center", "[520!, fill]"));
        this.desk = desk;
        this.left = left;
        looking = new Replacing(desk.workers(), desk.workers().lane("begin"));
        setName("begin");
        getAccessibleContext().setAccessibleName(Words.of("begin.name"));
        page.setFont(Palette.strong());
        page.setName("begin-page");
        add(page, "gapbottom 8");
        for (String name : PAGES) {
            pages.add(page(name), name);
        }
        add(pages);
        said.setName("begin-message");
        said.setForeground(Palette.FAULT.colour());
        add(said, "hmin 40");
        JPanel buttons = new JPanel(new MigLayout("insets 0", "[grow][][]"));
        JButton leave = button("begin-leave", "begin.leave", left);
        back.setName("begin-back");
        next.setName("begin-next");
        back.addActionListener(e -> turn(at - 1));
        next.addActionListener(e -> {
            if (at + 1 < PAGES.length) {
                turn(at + 1);
            } else {
                make();
            }
        });
        buttons.add(leave);
        buttons.add(back);
        buttons.add(next);
        add(buttons);
        turn(0);
    }

    /** Begins with a folder of frames. */
    public void framesIn(Path folder) {
        fields.set("frames", folder.toString());
        lookAtFrames();
    }

    private JPanel page(String name) {
        JPanel panel = new JPanel(new MigLayout("insets 0, wrap 2, fillx, gapy 8", "[160!][grow, fill]"));
        JLabel words = new JLabel("<html><div style='width:380px'>" + Words.of("begin." + name + ".words") + "</div></html>");
        words.setForeground(Palette.QUIET.colour());
        panel.add(words, "span, gapbottom 8");
        for (BeginFields.Field field : fields.of(name)) {
            JLabel label = new JLabel(Words.of("begin." + field.key()));
            label.setLabelFor(field.text());
            panel.add(label);
            panel.add(field.isPath() ? withChooser(field) : field.text());
        }
        return panel;
    }

    private JComponent withChooser(BeginFields.Field field) {
        JPanel row = new JPanel(new MigLayout("insets 0, fillx", "[grow, fill][]"));
        row.add(field.text(), "wmin 0");
        row.add(button("begin-choose-" + field.key(), "begin.choose", () -> choose(field)));
        field.text().addActionListener(e -> lookAtFrames());
        return row;
    }

    private static JButton button(String name, String key, Runnable run) {
        JButton button = new JButton(Words.of(key));
        button.setName(name);
        button.getAccessibleContext().setAccessibleName(Words.of(key));
        button.setToolTipText(Words.of(key));
        button.addActionListener(e -> run.run());
        return button;
    }

    private void choose(BeginFields.Field field) {
        JFileChooser chooser = new JFileChooser(field.text().getText());
        chooser.setFileSelectionMode(field.key().equals("start") ? JFileChooser.FILES_ONLY : JFileChooser.DIRECTORIES_ONLY);
        if (chooser.showOpenDialog(this) == JFileChooser.APPROVE_OPTION) {
            field.text().setText(chooser.getSelectedFile().getPath());
            lookAtFrames();
        }
    }

    /** Finds the frames of the folder, and takes their numbers and raster over. */
    private void lookAtFrames() {
        String folder = fields.text("frames");
        if (folder.isBlank()) {
            frames = new TreeMap<>();
            return;
        }
        looking.replace(cancel -> Found.in(Path.of(folder)), found -> {
            frames = found.frames();
            if (frames.isEmpty()) {
                say(Words.of("begin.no-frames", folder));
                return;
            }
            fields.set("first", String.valueOf(frames.firstKey()));
            fields.set("last", String.valueOf(Math.max(frames.lastKey(), frames.firstKey() + 1)));
            fields.set("raster", found.width() + " " + found.height());
            said.setForeground(Palette.TEXT.colour());
            said.setText(Words.of("begin.found", frames.size(), frames.firstKey(), frames.lastKey(), found.width(), found.height()));
        }, thrown -> say(Desk.words(thrown)));
    }

    /** Frames of a folder and the raster of the first. */
    private record Found(SortedMap<Integer, Path> frames, int width, int height) {
        static Found in(Path folder) {
            try {
                SortedMap<Integer, Path> all = Files.isDirectory(folder) ? ShotDraft.numbered(folder) : new TreeMap<>();
                if (all.isEmpty() || !all.get(all.firstKey()).toString().toLowerCase(java.util.Locale.ROOT).endsWith(".png")) {
                    return new Found(all, 960, 540);
                }
                Picture first = RetouchWork.read(all.get(all.firstKey()));
                return new Found(all, first.width(), first.height());
            } catch (IOException unreadable) {
                return new Found(new TreeMap<>(), 0, 0);
            }
        }
    }

    private void turn(int to) {
        at = to;
        turning.show(pages, PAGES[at]);
        page.setText(Words.of("begin.page", at + 1, PAGES.length, Words.of("begin." + PAGES[at])));
        back.setEnabled(at > 0);
        next.setText(Words.of(at + 1 < PAGES.length ? "begin.next" : "begin.make"));
        fields.of(PAGES[at]).get(0).text().requestFocusInWindow();
    }

    private void make() {
        ShotDraft draft;
        Path below;
        try {
            draft = fields.draft(frames);
            below = Path.of(fields.text("below"));
        } catch (IllegalArgumentException wrong) {
            say(wrong.getMessage());
            return;
        }
        next.setEnabled(false);
        looking.replace(cancel -> draft.write(below), made -> {
            next.setEnabled(true);
            desk.open(made);
            left.run();
        }, thrown -> {
            next.setEnabled(true);
            say(Desk.words(thrown));
        });
    }

    private void say(String words) {
        said.setForeground(Palette.FAULT.colour());
        said.setText("<html><div style='width:400px'>" + words.replace("<", "&lt;") + "</div></html>");
    }
}
