package org.wispwright.ui.window;

import java.util.LinkedHashMap;
import java.util.Map;
import javax.swing.JMenu;
import javax.swing.JMenuBar;

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
            menus.get(action.id().substring(0, action.id().indexOf('.'))).add(actions.get(action.id())).setName(action.id());
        }
        JMenuBar bar = new JMenuBar();
        menus.values().stream().filter(menu -> menu.getItemCount() > 0).forEach(bar::add);
        return bar;
    }
}
