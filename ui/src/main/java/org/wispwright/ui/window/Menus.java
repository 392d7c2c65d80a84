package org.wispwright.ui.window;

import java.awt.event.KeyEvent;
import java.util.LinkedHashMap;
import java.util.Map;
import javax.swing.Action;
import javax.swing.JMenu;
import javax.swing.JMenuBar;
import javax.swing.JMenuItem;
import javax.swing.KeyStroke;

/** The menu bar: every action under the word before its dot. */
final class Menus {
    private Menus() {
    }

    static JMenuBar of(ActionTable actions) {
        Map<String, JMenu> menus = new LinkedHashMap<>();
        for (String name : new String[] {"shot", "edit", "note", "hand", "look", "compare", "frame", "take", "help"}) {
            JMenu menu = new JMenu(Words.of("menu." + name));
            menu.setName("menu-" + name);
            menus.put(name, menu);
        }
        for (DeskAction action : actions.all()) {
            menus.get(action.id().substring(0, action.id().indexOf('.'))).add(new Item(actions.get(action.id()))).setName(action.id());
        }
        JMenuBar bar = new JMenuBar();
        menus.values().stream().filter(menu -> menu.getItemCount() > 0).forEach(bar::add);
        return bar;
    }

    /** Shows its key and leaves it to the {@link ActionTable}, which knows when a key belongs to what is being typed. */
    private static final class Item extends JMenuItem {
        private Item(Action action) {
            super(action);
        }

        @Override
        protected boolean processKeyBinding(KeyStroke stroke, KeyEvent e, int condition, boolean pressed) {
            return false;
        }
    }
}
