package org.wispwright.ui.window.notes;

import java.awt.BorderLayout;
import java.awt.Component;
import java.awt.Dimension;
import java.awt.Rectangle;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalInt;
import java.util.function.Function;
import javax.swing.BorderFactory;
import javax.swing.JButton;
import javax.swing.JMenuItem;
import javax.swing.JPanel;
import javax.swing.JPopupMenu;
import javax.swing.JScrollPane;
import javax.swing.JTextArea;
import javax.swing.Scrollable;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.OpenShot;
import org.wispwright.ui.desk.Pictures.Ask;
import org.wispwright.ui.desk.Places;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** The notes as cards, by frame; below them the way to a new one, or the questions of an action. */
public final class NotesPanel extends JPanel {
    private static final String ASKS = "notes";

    private final Desk desk;
    private final NoteActions actions;
    private final NoteBoxes boxes;
    private final Cards cards = new Cards();
    private final Map<String, NoteCard> byId = new LinkedHashMap<>();
    private final JTextArea empty = new JTextArea(Words.of("notes.empty"));
    private final JPanel foot = new JPanel(new BorderLayout());
    private final JButton make;
    private DeskState seen = DeskState.EMPTY;

    /** Follows a desk. */
    public NotesPanel(Desk desk) {
        super(new BorderLayout());
        this.desk = desk;
        actions = new NoteActions(desk, this);
        boxes = new NoteBoxes(desk, this::leaveBox);
        setName("notes");
        setBackground(Palette.PANEL.colour());
        getAccessibleContext().setAccessibleName(Words.of("notes.name"));
        // Always there: a card's height goes with its width, so a bar that comes and goes would come and go for ever.
        JScrollPane scroll = new JScrollPane(cards, JScrollPane.VERTICAL_SCROLLBAR_ALWAYS, JScrollPane.HORIZONTAL_SCROLLBAR_NEVER);
        scroll.setBorder(BorderFactory.createEmptyBorder());
        scroll.setName("notes-scroll");
        scroll.getVerticalScrollBar().setUnitIncrement(16);
        scroll.getViewport().setBackground(Palette.PANEL.colour());
        make = new JButton(Words.of("action.note.new"));
        make.setName("note-new");
        make.setToolTipText(actions.make().tip());
        make.addActionListener(e -> actions.make().run().run());
        empty.setName("notes-empty");
        empty.setEditable(false);
        empty.setFocusable(false);
        empty.setOpaque(false);
        empty.setLineWrap(true);
        empty.setWrapStyleWord(true);
        empty.setForeground(Palette.QUIET.colour());
        foot.setOpaque(false);
        foot.setBorder(BorderFactory.createEmptyBorder(4, 8, 8, 8));
        foot.add(make);
        add(scroll, BorderLayout.CENTER);
        add(foot, BorderLayout.SOUTH);
        desk.listen(this::follow);
    }

    /** What can be done here. */
    public List<DeskAction> actions() {
        List<DeskAction> all = new ArrayList<>();
        all.add(actions.make());
        all.addAll(actions.withNote());
        all.addAll(actions.others());
        return all;
    }

    /** Shows questions below the notes. */
    void box(Function<NoteBoxes, NoteBox> making) {
        NoteBox box = making.apply(boxes);
        foot.removeAll();
        foot.add(box);
        foot.revalidate();
        foot.repaint();
        box.begin();
    }

    private void leaveBox() {
        foot.removeAll();
        foot.add(make);
        foot.revalidate();
        foot.repaint();
        desk.state().note().map(byId::get).ifPresentOrElse(Component::requestFocusInWindow, make::requestFocusInWindow);
    }

    /** Lets a person type a note's words. */
    void editWords(String id) {
        NoteCard card = byId.get(id);
        if (card != null) {
            card.scrollRectToVisible(new Rectangle(card.getSize()));
            card.editWords();
        }
    }

    private void follow(DeskState state) {
        DeskState before = seen;
        seen = state;
        make.setEnabled(state.shot().isPresent());
        if (state.shot().isEmpty()) {
            return;
        }
        OpenShot shot = state.shot().get();
        OptionalInt take = Places.judged(state);
        boolean other = before.shot().map(s -> s.folder() != shot.folder()).orElse(true);
        if (other) {
            byId.clear();
            leaveBox();
        } else if (before.shot().get() == shot && before.note().equals(state.note()) && Places.judged(before).equals(take)) {
            return;                                                            // another frame, or what is no matter here
        }
        arrange(shot);
        byId.values().forEach(card -> card.follow(state));
        ask(shot, take);
        if (!before.note().equals(state.note())) {
            state.note().map(byId::get).ifPresent(card -> {
                cards.validate();
                card.scrollRectToVisible(new Rectangle(card.getSize()));
            });
        }
    }

    private void arrange(OpenShot shot) {
        List<String> ids = Places.inOrder(shot).stream().map(l -> l.note().id()).toList();
        if (new ArrayList<>(byId.keySet()).equals(ids) && cards.getComponentCount() > 0) {
            return;
        }
        boolean hadFocus = byId.values().stream().anyMatch(Component::isFocusOwner);
        Map<String, NoteCard> kept = new LinkedHashMap<>(byId);
        byId.clear();
        cards.removeAll();
        for (String id : ids) {
            NoteCard card = kept.containsKey(id) ? kept.get(id) : card(id);
            byId.put(id, card);
            cards.add(card);
        }
        if (ids.isEmpty()) {
            cards.add(empty);
        }
        cards.revalidate();
        cards.repaint();
        if (hadFocus) {
            desk.state().note().map(byId::get).ifPresent(Component::requestFocusInWindow);
        }
    }

    private NoteCard card(String id) {
        NoteCard card = new NoteCard(desk, id, this::menu);
        card.key("DOWN", () -> focus(id, 1));
        card.key("UP", () -> focus(id, -1));
        return card;
    }

    private void focus(String from, int by) {
        List<String> ids = new ArrayList<>(byId.keySet());
        int to = Math.max(0, Math.min(ids.size() - 1, ids.indexOf(from) + by));
        byId.get(ids.get(to)).requestFocusInWindow();
    }

    private void menu(String id, Component over, int x, int y) {
        desk.look(s -> Places.at(s, id));
        JPopupMenu menu = new JPopupMenu();
        menu.setName("note-menu");
        for (DeskAction action : actions.withNote()) {
            JMenuItem item = menu.add(Words.of("action." + action.id()));
            item.setName("menu-" + action.id());
            item.setToolTipText(action.tip());
            item.setEnabled(action.enabled().test(desk.state()));
            item.addActionListener(e -> action.run().run());
        }
        menu.show(over, x, y);
    }

    private void ask(OpenShot shot, OptionalInt take) {
        List<Ask> asks = new ArrayList<>();
        desk.state().note().map(byId::get).ifPresent(open -> asks.addAll(open.asks(shot, take)));
        byId.values().forEach(card -> asks.addAll(card.asks(shot, take)));
        desk.thumbnails().want(ASKS, shot, asks.stream().distinct().toList(), this::figures);
        take.ifPresent(number -> desk.met().want(ASKS, shot, number, this::figures));
    }

    private void figures() {
        if (seen.shot().isPresent()) {
            byId.values().forEach(card -> card.figures(seen));
        }
    }

    /** The cards below each other, as wide as the panel. */
    private static final class Cards extends JPanel implements Scrollable {
        private Cards() {
            super(new MigLayout("insets 8 8 4 8, fillx, wrap 1, gapy 8", "[grow, fill, 0:0:]"));
            setName("cards");
            setOpaque(false);
        }

        @Override
        public Dimension getPreferredScrollableViewportSize() {
            return getPreferredSize();
        }

        @Override
        public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
            return 16;
        }

        @Override
        public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
            return visible.height;
        }

        @Override
        public boolean getScrollableTracksViewportWidth() {
            return true;
        }

        @Override
        public boolean getScrollableTracksViewportHeight() {
            return false;
        }
    }
}
