package org.wispwright.ui.window.notes;

import java.awt.event.ActionEvent;
import javax.swing.AbstractAction;
import javax.swing.BorderFactory;
import javax.swing.JButton;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.KeyStroke;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** A few questions below the notes, in place of a box over the window. Escape leaves it. */
final class NoteBox extends JPanel {
    private final String name;
    private final Runnable leave;
    private JComponent first;

    /**
     * @param name  before the names of its parts
     * @param title what it is about
     * @param leave puts it away
     */
    NoteBox(String name, String title, Runnable leave) {
        super(new MigLayout("insets 8, fillx, wrap 1, gapy 4", "[grow, fill, 0:0:]"));
        this.name = name;
        this.leave = leave;
        setName(name);
        getAccessibleContext().setAccessibleName(title);
        setBackground(Palette.CARD.colour());
        setBorder(BorderFactory.createLineBorder(Palette.LINE.colour()));
        JLabel head = new JLabel(title);
        head.setFont(Palette.strong());
        head.setToolTipText(title);
        add(head, "wmin 0");
        getInputMap(WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke("ESCAPE"), "leave");
        getActionMap().put("leave", new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent e) {
                leave.run();
            }
        });
    }

    /** A part with its words above it. @param part its name */
    <T extends JComponent> T row(String part, String words, T field) {
        JLabel label = new JLabel(words);
        label.setFont(Palette.small());
        label.setLabelFor(field);
        add(label, "wmin 0");
        return bare(part, words, field);
    }

    /** A part that says its words itself. */
    <T extends JComponent> T bare(String part, String words, T field) {
        field.setName(name + "-" + part);
        field.getAccessibleContext().setAccessibleName(words);
        if (field.getToolTipText() == null) {
            field.setToolTipText(words);
        }
        add(field, "wmin 0");
        first = first == null ? field : first;
        return field;
    }

    /** The two ways out. @param does a verb */
    void ends(String does, Runnable run) {
        JButton done = new JButton(does);
        done.setName(name + "-done");
        done.setToolTipText(does);
        done.addActionListener(e -> run.run());
        JButton no = new JButton(Words.of("notes.leave"));
        no.setName(name + "-leave");
        no.setToolTipText(Words.of("notes.leave.tip"));
        no.addActionListener(e -> leave.run());
        JPanel both = new JPanel(new MigLayout("insets 4 0 0 0", "[]4[]"));
        both.setOpaque(false);
        both.add(done);
        both.add(no);
        add(both, "wmin 0");
    }

    /** Puts the focus on the first part. */
    void begin() {
        if (first != null) {
            first.requestFocusInWindow();
        }
    }
}
