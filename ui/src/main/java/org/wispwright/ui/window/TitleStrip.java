package org.wispwright.ui.window;

import javax.swing.JButton;
import javax.swing.JLabel;
import javax.swing.JPanel;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Message;
import org.wispwright.ui.desk.Showing;

/** The line above everything: which shot, view, frame and takes are shown; what the desk has to say; the way to every action. */
final class TitleStrip extends JPanel {
    private final JLabel where = new JLabel();
    private final JLabel said = new JLabel();
    private final JLabel saved = new JLabel();

    TitleStrip(Desk desk, ActionTable actions) {
        super(new MigLayout("insets 4 8 4 8, fillx", "[][grow, right][][]"));
        setName("title");
        where.setName("where");
        where.setFont(Palette.strong());
        said.setName("message");
        said.setMinimumSize(new java.awt.Dimension(0, 0));
        saved.setName("saved");
        saved.setForeground(Palette.QUIET.colour());
        JButton find = new JButton(actions.get("help.find"));
        find.setName("find");
        add(where);
        add(said, "wmin 0");
        add(saved);
        add(find);
        desk.listen(this::follow);
    }

    private void follow(DeskState state) {
        where.setText(state.shot().isEmpty() ? "" : inWords(state, state.showing().orElseThrow()));
        said.setText(state.message().map(Message::words).orElse(""));
        said.setToolTipText(said.getText());
        said.setForeground(state.message().filter(m -> m.kind() == Message.Kind.FAULT).isPresent() ? Palette.FAULT.colour()
                : Palette.TEXT.colour());
        saved.setText(Words.of(state.saving().isDone() ? "saved.done" : state.saving().refused().isPresent() ? "saved.refused"
                : "saved.waiting", state.saving().waiting()));
        saved.setToolTipText(state.saving().refused().map(f -> f.inWords()).orElse(Words.of("saved.tip")));
    }

    private static String inWords(DeskState state, Showing showing) {
        String shown = showing.other().map(far -> Words.of("title.against." + showing.against().name().toLowerCase(java.util.Locale.ROOT),
                Sources.inWords(state.seen(showing.near())), Sources.inWords(state.seen(far)))).orElse(Sources.inWords(state.seen(showing.near())));
        return Words.of("title.where", state.shot().orElseThrow().setup().name(), showing.view(), showing.frame(), shown);
    }
}
