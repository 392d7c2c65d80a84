package org.wispwright.ui.window.notes;

import java.awt.Color;
import java.awt.Component;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.Insets;
import java.awt.Rectangle;
import java.awt.event.ActionEvent;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import javax.swing.AbstractAction;
import javax.swing.JButton;
import javax.swing.JCheckBox;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JSpinner;
import javax.swing.KeyStroke;
import javax.swing.SpinnerNumberModel;
import javax.swing.border.AbstractBorder;
import net.miginfocom.swing.MigLayout;
import org.wispwright.render.view.Raster;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.NoteEdit;
import org.wispwright.ui.desk.OpenShot;
import org.wispwright.ui.desk.Pictures.Ask;
import org.wispwright.ui.desk.Places;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.desk.Thumbnails;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.window.LineIcon;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** One note: its words, where it is, what it wants and what came of it. */
final class NoteCard extends JPanel {
    private static final int ROWS = 128;
    private static final float LARGE_TYPE = 18;

    private final Desk desk;
    private final String id;
    private final JLabel where = new JLabel();
    private final JLabel open = new JLabel(Words.of("notes.open"));
    private final JLabel holds = new JLabel(LineIcon.HOLD);
    private final JButton more = new JButton(LineIcon.MORE);
    private final NoteWords words;
    private final ThumbnailRow thumbnails = new ThumbnailRow(List.of(Words.of("notes.original"), Words.of("notes.wanted"),
            Words.of("notes.got")));
    private final MetBar met = new MetBar();
    private final JCheckBox on = new JCheckBox(Words.of("notes.on"));
    private final JSpinner weight = new JSpinner(new SpinnerNumberModel(1.0, 0.01, 1000, 0.1));
    private boolean following;
    private boolean isOpen;

    /** @param menu shows what else can be done with the note, at a place of a component */
    NoteCard(Desk desk, String id, NoteMenu menu) {
        super(new MigLayout("insets 8 12 8 8, fillx, wrap 1, gapy 4, hidemode 3", "[grow, fill, 0:0:]"));
        this.desk = desk;
        this.id = id;
        setName("note-" + id);
        setFocusable(true);
        setBackground(Palette.CARD.colour());
        setBorder(new Edge());
        words = new NoteWords(text -> desk.edit(NoteEdit.words(Words.of("notes.edit.words"), id, text)), this::requestFocusInWindow);
        name(words, "words");
        words.setToolTipText(Words.of("notes.words.tip"));
        where.setFont(Palette.small());
        name(where, "where");
        open.setFont(Palette.strong());
        open.setForeground(Palette.ACCENT.colour());
        name(open, "open");
        holds.setFont(Palette.small());
        name(holds, "holds");
        name(thumbnails, "pictures");
        thumbnails.setToolTipText(Words.of("notes.pictures.tip"));
        name(met, "met");
        name(on, "on");
        on.setOpaque(false);
        on.setToolTipText(Words.of("notes.on.tip"));
        on.addActionListener(e -> desk.edit(NoteEdit.on(Words.of(on.isSelected() ? "notes.edit.on" : "notes.edit.off"), id,
                on.isSelected())));
        name(weight, "weight");
        ((JSpinner.NumberEditor) weight.getEditor()).getFormat().applyPattern("0.##");
        ((JSpinner.NumberEditor) weight.getEditor()).getTextField().setColumns(3);
        ((JSpinner.NumberEditor) weight.getEditor()).getTextField().setName("weight-text-" + id);
        weight.setToolTipText(Words.of("notes.weight.tip"));
        weight.addChangeListener(e -> weighs());
        name(more, "more");
        more.putClientProperty("JButton.buttonType", "toolBarButton");
        more.setToolTipText(Words.of("notes.more.tip"));
        more.addActionListener(e -> menu.show(id, more, 0, more.getHeight()));
        lay();
        listen(menu);
    }

    /** Shows what else can be done with a note. */
    interface NoteMenu {
        void show(String note, Component over, int x, int y);
    }

    private void name(JComponent c, String part) {
        c.setName(part + "-" + id);
    }

    private void lay() {
        JPanel top = clear(new JPanel(new MigLayout("insets 0, fillx, hidemode 3", "[grow, 0:pref:]4[]4[]4[]")));
        JPanel foot = clear(new JPanel(new MigLayout("insets 0, fillx, gapy 4", "[]push[]4[]")));
        JLabel weighs = new JLabel(Words.of("notes.weight"));
        weighs.setLabelFor(weight);
        weighs.setFont(Palette.small());
        if (where.getFont().getSize2D() > LARGE_TYPE) {
            top.add(where, "wmin 0, span, split 2, pushx, growx");
            top.add(more, "wrap");
            top.add(open);
            foot.add(on, "span, split 2, gapright 0");
            foot.add(holds, "wrap");
            foot.add(weighs, "span, wrap");
            foot.add(weight, "span, growx, wmin 0");
        } else {
            top.add(where, "wmin 0");
            top.add(open);
            top.add(holds);
            top.add(more);
            foot.add(on);
            foot.add(weighs);
            foot.add(weight);
        }
        add(top);
        add(words, "wmin 0");
        add(thumbnails, "wmin 0");
        add(met, "wmin 0");
        add(foot);
    }

    private static JPanel clear(JPanel panel) {
        panel.setOpaque(false);
        return panel;
    }

    private void listen(NoteMenu menu) {
        MouseAdapter pointer = new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent e) {
                if (words.isEditable()) {
                    return;
                }
                requestFocusInWindow();
                desk.look(s -> Places.at(s, id));
                if (e.isPopupTrigger()) {
                    menu.show(id, e.getComponent(), e.getX(), e.getY());
                } else if (e.getClickCount() == 2 && e.getComponent() == words) {
                    words.edit();
                }
            }

            @Override
            public void mouseReleased(MouseEvent e) {
                if (e.isPopupTrigger()) {
                    menu.show(id, e.getComponent(), e.getX(), e.getY());
                }
            }
        };
        for (JComponent c : new JComponent[] {this, words, where, open, holds, thumbnails, met}) {
            c.addMouseListener(pointer);
        }
        addFocusListener(new FocusAdapter() {
            @Override
            public void focusGained(FocusEvent e) {
                scrollRectToVisible(new Rectangle(0, 0, getWidth(), getHeight()));
                repaint();
            }

            @Override
            public void focusLost(FocusEvent e) {
                repaint();
            }
        });
        key("ENTER", () -> desk.look(s -> Places.at(s, id)));
        key("F2", this::editWords);
    }

    /** Does something by a key while the card has the focus. */
    void key(String key, Runnable run) {
        getInputMap(WHEN_FOCUSED).put(KeyStroke.getKeyStroke(key), key);
        getActionMap().put(key, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent e) {
                run.run();
            }
        });
    }

    /** Lets a person type other words. */
    void editWords() {
        words.edit();
    }

    private void weighs() {
        double wished = ((Number) weight.getValue()).doubleValue();
        if (!following) {
            desk.edit(NoteEdit.weight(Words.of("notes.edit.weight"), id, wished));
        }
    }

    /** The pictures it wants. @param take to judge; empty if there is none */
    List<Ask> asks(OpenShot shot, OptionalInt take) {
        Note note = shot.note(id).orElseThrow().note();
        return take.isEmpty() ? List.of() : List.of(ask(shot, note, Source.ORIGINAL), ask(shot, note, new Source.Wanted(id)),
                ask(shot, note, new Source.Take(take.getAsInt())));
    }

    private static Ask ask(OpenShot shot, Note note, Source source) {
        return Thumbnails.ask(shot, source, note.view(), note.frame(), ROWS);
    }

    /** Brings everything up to the state. */
    void follow(DeskState state) {
        OpenShot shot = state.shot().orElseThrow();
        Listed listed = shot.note(id).orElseThrow();
        Note note = listed.note();
        isOpen = state.note().map(id::equals).orElse(false);
        following = true;
        words.show(note.words());
        words.setForeground((listed.on() ? Palette.TEXT : Palette.QUIET).colour());
        where.setText(Words.of("notes.where", note.frame(), note.view()));
        where.setForeground(Palette.QUIET.colour());
        open.setVisible(isOpen);
        holds.setVisible(!note.holds().isEmpty());
        holds.setText(String.valueOf(note.holds().size()));
        holds.setForeground(Palette.HELD.colour());
        holds.setToolTipText(Words.of(note.holds().size() == 1 ? "notes.hold.tip" : "notes.holds.tip", note.holds().size()));
        on.setSelected(listed.on());
        if (((Number) weight.getValue()).doubleValue() != note.weight()) {
            weight.setValue(note.weight());
        }
        Raster raster = shot.setup().view(note.view()).orElseThrow().view().raster();
        thumbnails.shape((double) raster.width() / raster.height());
        following = false;
        names(note.words());
        figures(state);
        repaint();
    }

    private void names(String said) {
        getAccessibleContext().setAccessibleName(Words.of(isOpen ? "notes.card.open" : "notes.card", said));
        words.getAccessibleContext().setAccessibleName(Words.of("notes.words.of", said));
        thumbnails.getAccessibleContext().setAccessibleName(Words.of("notes.pictures.of", said));
        on.getAccessibleContext().setAccessibleName(Words.of("notes.on.of", said));
        weight.getAccessibleContext().setAccessibleName(Words.of("notes.weight.of", said));
        ((JSpinner.NumberEditor) weight.getEditor()).getTextField().getAccessibleContext()
                .setAccessibleName(Words.of("notes.weight.of", said));
        more.getAccessibleContext().setAccessibleName(Words.of("notes.more.of", said));
    }

    /** Shows the pictures and the figures that have come. */
    void figures(DeskState state) {
        OpenShot shot = state.shot().orElseThrow();
        OptionalInt take = Places.judged(state);
        List<Ask> asks = asks(shot, take);
        for (int n = 0; n < 3; n++) {
            thumbnails.show(n, asks.isEmpty() ? Optional.empty() : desk.thumbnails().get(shot, asks.get(n)));
        }
        met.show(take, take.isEmpty() ? Optional.empty() : desk.met().of(shot, shot.note(id).orElseThrow().note(), take.getAsInt()));
    }

    /** True if all its pictures have come. */
    boolean hasPictures() {
        return thumbnails.has(0) && thumbnails.has(1) && thumbnails.has(2);
    }

    /** A line round the card; a broad one at its left if the note is open, a full one in the accent if the card has the focus. */
    private final class Edge extends AbstractBorder {
        @Override
        public Insets getBorderInsets(Component c, Insets insets) {
            insets.set(1, 1, 1, 1);
            return insets;
        }

        @Override
        public void paintBorder(Component c, Graphics g, int x, int y, int width, int height) {
            Graphics2D g2 = (Graphics2D) g.create();
            Color accent = Palette.ACCENT.colour();
            g2.setColor(isFocusOwner() ? accent : Palette.LINE.colour());
            g2.drawRect(x, y, width - 1, height - 1);
            if (isOpen) {
                g2.setColor(accent);
                g2.fillRect(x, y, Palette.STEP, height);
            }
            g2.dispose();
        }
    }
}
