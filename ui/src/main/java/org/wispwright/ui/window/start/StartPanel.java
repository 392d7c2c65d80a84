package org.wispwright.ui.window.start;

import java.util.List;
import javax.swing.JLabel;
import javax.swing.JPanel;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.Words;

/** What a person sees before there is a shot. */
public final class StartPanel extends JPanel {
    /** Follows a desk. */
    public StartPanel(Desk desk) {
        super(new MigLayout("insets 32, center, wrap 1"));
        setName("start");
        getAccessibleContext().setAccessibleName(Words.of("start.name"));
        add(new JLabel(Words.of("start.name")));
    }

    /** What can be done here. */
    public List<DeskAction> actions() {
        return List.of();
    }
}
