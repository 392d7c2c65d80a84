package org.wispwright.ui.window;

import java.util.List;
import org.wispwright.ui.desk.Desk;

/** What can be done anywhere on the desk. */
final class DeskActions {
    private final Desk desk;
    private final DeskWindow window;

    DeskActions(Desk desk, DeskWindow window) {
        this.desk = desk;
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
                DeskAction.always("help.find", "ctrl F", () -> ActionFinder.open(window)));
    }
}
