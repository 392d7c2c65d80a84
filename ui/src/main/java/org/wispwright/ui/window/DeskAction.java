package org.wispwright.ui.window;

import java.util.function.Function;
import java.util.function.Predicate;
import javax.swing.KeyStroke;
import org.wispwright.ui.desk.DeskState;

/**
 * Something a person can do: found in menus, in the list of all actions, and by its key. Its words are {@code action.ID} in the bundle,
 * its tool tip {@code action.ID.tip}.
 *
 * @param id      such as {@code note.new}; what stands before the dot is its menu
 * @param key     its shortcut; null for none
 * @param enabled whether it can be done now
 * @param run     does it; on Swing's thread
 * @param more    what is added to its words now, such as the name of what undo takes back; null for nothing
 */
public record DeskAction(String id, KeyStroke key, Predicate<DeskState> enabled, Runnable run, Function<DeskState, String> more) {
    /** An action whose words never change. @param key as Swing writes it, such as "ctrl Z"; null for none */
    public static DeskAction of(String id, String key, Predicate<DeskState> enabled, Runnable run) {
        return new DeskAction(id, key == null ? null : Keys.stroke(key), enabled, run, null);
    }

    /** An action that can be done at any time. */
    public static DeskAction always(String id, String key, Runnable run) {
        return of(id, key, state -> true, run);
    }

    /** An action that needs a shot on the desk. */
    public static DeskAction withShot(String id, String key, Runnable run) {
        return of(id, key, state -> state.shot().isPresent(), run);
    }

    /** An action whose words go on by something. */
    public DeskAction saying(Function<DeskState, String> words) {
        return new DeskAction(id, key, enabled, run, words);
    }

    /** What it does, with its shortcut. */
    public String tip() {
        String tip = Words.of(Words.has("action." + id + ".tip") ? "action." + id + ".tip" : "action." + id);
        return key == null ? tip : tip + "  (" + Keys.inWords(key) + ")";
    }
}
