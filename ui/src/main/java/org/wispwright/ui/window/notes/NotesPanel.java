package org.wispwright.ui.window.notes;

import java.util.List;
import javax.swing.JPanel;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** Shows the notes as cards. */
public final class NotesPanel extends JPanel {
    private final Desk desk;

    /** Follows a desk. */
    public NotesPanel(Desk desk) {
        super(new MigLayout("insets 8, fill"));
        this.desk = desk;
        setName("notes");
        setBackground(Palette.PANEL.colour());
        getAccessibleContext().setAccessibleName(Words.of("notes.name"));
        desk.listen(this::follow);
    }

    /** What can be done here. */
    public List<DeskAction> actions() {
        return List.of();
    }

    private void follow(DeskState state) {
        setEnabled(state.shot().isPresent());
    }
}
