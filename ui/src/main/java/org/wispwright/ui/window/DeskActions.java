package org.wispwright.ui.window;

import java.util.List;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Memory;

/** What can be done anywhere on the desk. */
final class DeskActions {
    private final Desk desk;
    private final DeskWindow window;
    private final Memory memory;

    DeskActions(Desk desk, DeskWindow window, Memory memory) {
        this.desk = desk;
        this.memory = memory;
        this.window = window;
    }

    List<DeskAction> all() {
        return List.of(
                DeskAction.of("edit.undo", "ctrl Z", s -> s.history().undoName().isPresent(), desk::undo)
                        .saying(s -> s.history().undoName().orElse("")),
                DeskAction.of("edit.redo", "ctrl shift Z", s -> s.history().redoName().isPresent(), desk::redo)
                        .saying(s -> s.history().redoName().orElse("")),
                DeskAction.of("shot.save", "ctrl S", s -> !s.saving().isDone(), desk::saveAgain),
                DeskAction.always("shot.leave", "ctrl Q", window::close),
                DeskAction.always("look.theme", null, () -> window.renew(m -> m.withDark(!m.dark()))),
                DeskAction.always("look.text-larger", "ctrl shift UP", () -> text(1.1)),
                DeskAction.always("look.text-smaller", "ctrl shift DOWN", () -> text(1 / 1.1)),
                DeskAction.always("help.find", "ctrl F", () -> ActionFinder.open(window)));
    }

    private void text(double factor) {
        double scale = Math.round(100 * memory.now().textScale() * factor) / 100.0;
        window.renew(m -> m.withTextScale(scale));
    }
}
