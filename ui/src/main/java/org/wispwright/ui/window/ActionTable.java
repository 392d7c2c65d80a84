package org.wispwright.ui.window;

import java.awt.KeyboardFocusManager;
import java.awt.event.ActionEvent;
import java.awt.event.InputEvent;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import javax.swing.AbstractAction;
import javax.swing.Action;
import javax.swing.JComponent;
import javax.swing.text.JTextComponent;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;

/** Everything that can be done on the desk, as Swing's actions: one for each {@link DeskAction}, enabled and worded by the state. */
public final class ActionTable {
    private final Map<String, Entry> entries = new LinkedHashMap<>();
    private final JComponent root;

    /** @param root the component in whose window the shortcuts work */
    ActionTable(Desk desk, JComponent root) {
        this.root = root;
        desk.listen(this::follow);
    }

    /** Adds actions. @throws IllegalArgumentException if an id or a key is taken */
    public void add(List<DeskAction> actions) {
        for (DeskAction action : actions) {
            Entry entry = new Entry(action);
            if (entries.put(action.id(), entry) != null) {
                throw new IllegalArgumentException("action: '" + action.id() + "' is there already");
            }
            if (action.key() != null) {
                Object taken = root.getInputMap(JComponent.WHEN_IN_FOCUSED_WINDOW).get(action.key());
                if (taken != null) {
                    throw new IllegalArgumentException("action: '" + action.id() + "' wants the key of '" + taken + "'");
                }
                root.getInputMap(JComponent.WHEN_IN_FOCUSED_WINDOW).put(action.key(), action.id());
                root.getActionMap().put(action.id(), new OutsideText(entry));
            }
        }
    }

    /** Swing's action of an id, for a button or a menu. @throws IllegalArgumentException if there is none */
    public Action get(String id) {
        Entry entry = entries.get(id);
        if (entry == null) {
            throw new IllegalArgumentException("action: there is no '" + id + "'");
        }
        return entry;
    }

    /** All actions in the order in which they were added. */
    public List<DeskAction> all() {
        List<DeskAction> all = new ArrayList<>();
        entries.values().forEach(entry -> all.add(entry.action));
        return Collections.unmodifiableList(all);
    }

    private void follow(DeskState state) {
        entries.values().forEach(entry -> entry.follow(state));
    }

    /** Brings enabled and words up to the state; after adding. */
    void refresh(DeskState state) {
        follow(state);
    }

    private static final class Entry extends AbstractAction {
        private final DeskAction action;

        Entry(DeskAction action) {
            super(Words.of("action." + action.id()));
            this.action = action;
            putValue(ACCELERATOR_KEY, action.key());
            putValue(SHORT_DESCRIPTION, action.tip());
        }

        void follow(DeskState state) {
            setEnabled(action.enabled().test(state));
            if (action.more() != null) {
                String more = action.more().apply(state);
                putValue(NAME, more.isEmpty() ? Words.of("action." + action.id()) : Words.of("action." + action.id()) + " " + more);
            }
        }

        @Override
        public void actionPerformed(ActionEvent e) {
            if (isEnabled()) {
                action.run().run();
            }
        }
    }

    /** The same by its key, but a key without Ctrl or Alt belongs to a text field that has the focus. */
    private static final class OutsideText extends AbstractAction {
        private final Entry entry;

        OutsideText(Entry entry) {
            this.entry = entry;
        }

        @Override
        public boolean isEnabled() {
            boolean plain = (entry.action.key().getModifiers()
                    & (InputEvent.CTRL_DOWN_MASK | InputEvent.ALT_DOWN_MASK | InputEvent.META_DOWN_MASK)) == 0;
            boolean typing = KeyboardFocusManager.getCurrentKeyboardFocusManager().getFocusOwner() instanceof JTextComponent text
                    && text.isEditable();
            return entry.isEnabled() && !(plain && typing);
        }

        @Override
        public void actionPerformed(ActionEvent e) {
            entry.actionPerformed(e);
        }
    }
}
