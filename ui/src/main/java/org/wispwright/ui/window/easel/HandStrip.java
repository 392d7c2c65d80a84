package org.wispwright.ui.window.easel;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javax.swing.ButtonGroup;
import javax.swing.JButton;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JPopupMenu;
import javax.swing.JRadioButtonMenuItem;
import javax.swing.JToggleButton;
import net.miginfocom.swing.MigLayout;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.Places;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.ui.desk.Retouching.Edit;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.matte.Window;

/**
 * * The strip under the picture: what the pointer does now, with the two or three settings that this has. Where the hand has nothing to
 * work on it says so in a sentence, with the one button that helps.
 */
public final class HandStrip extends JPanel implements Retouching.Follower {
    private static final double WIDER = 1.15;
    private static final double STRONGER = 0.05;

    private final Desk desk;
    private final Retouching retouching;
    private final Runnable newNote;
    private final Map<HandKind, JToggleButton> buttons = new EnumMap<>(HandKind.class);
    private final Map<Class<? extends Hand>, Hand> before = new java.util.HashMap<>();
    private final ButtonGroup group = new ButtonGroup();
    private final JPanel row = new JPanel(new MigLayout("insets 0, gapx 0"));
    private final JPanel words = new JPanel(new MigLayout("insets 0, hidemode 3, gapx 8, aligny center"));
    private final JLabel name = new JLabel();
    private final HandSettings settings;
    private final JLabel sentence = new JLabel();
    private final JButton help = new JButton();
    private final JButton steps = new JButton();
    private Runnable helping = () -> { };

    /** Follows a desk. @param newNote makes a note on the frame and in the view that are shown */
    public HandStrip(Desk desk, Retouching retouching, Runnable newNote) {
        super(new MigLayout("insets 4 8 4 8, fillx, gapy 4"));
        this.desk = desk;
        this.retouching = retouching;
        this.newNote = newNote;
        settings = new HandSettings(desk, retouching);
        setName("hand");
        setBackground(Palette.PANEL.colour());
        getAccessibleContext().setAccessibleName(Words.of("hand.name"));
        row.setOpaque(false);
        words.setOpaque(false);
        for (HandKind kind : HandKind.values()) {
            JToggleButton button = new JToggleButton(new HandIcon(kind));
            button.setName("hand-" + kind.word());
            button.setToolTipText(kind.tip());
            button.getAccessibleContext().setAccessibleName(kind.inWords());
            button.putClientProperty("JButton.buttonType", "toolBarButton");
            button.addActionListener(e -> take(kind));
            group.add(button);
            buttons.put(kind, button);
            row.add(button);
        }
        steps.setName("hand-steps");
        steps.setToolTipText(Words.of("action.hand.steps.tip") + "  (" + Words.of("hand.steps.key") + ")");
        steps.addActionListener(e -> StepsWindow.open(this, desk, retouching));
        name.setFont(Palette.strong());
        name.setName("hand-now");
        sentence.setName("hand-sentence");
        sentence.setForeground(Palette.QUIET.colour());
        help.setName("hand-help");
        help.getAccessibleContext().setAccessibleName(Words.of("hand.go"));
        help.addActionListener(e -> helping.run());
        words.add(name);
        words.add(settings);
        words.add(sentence, "wmin 0");
        words.add(help);
        // As high as its highest setting whatever it shows: the picture above must not jump.
        int high = Math.max(settings.getPreferredSize().height, help.getPreferredSize().height);
        add(row, "split 2");
        add(steps, "gapleft push, wrap");
        add(words, "growx, pushx, wmin 0, height " + high + "px!");
        retouching.listen(this);
        desk.listen(this::follow);
    }

    @Override
    public void live(Optional<Picture> picture) {
        follow(desk.state());
    }

    @Override
    public void changed(Window pixels) {
        // Only the picture changed.
    }

    @Override
    public void rested() {
        follow(desk.state());
    }

    private void follow(DeskState state) {
        HandKind kind = HandKind.of(state.hand());
        before.put(state.hand().getClass(), state.hand());
        buttons.get(kind).setSelected(true);
        name.setText(kind.inWords());
        settings.follow(state);
        int count = retouching.operations().size();
        steps.setText(Words.of("hand.steps", count));
        steps.setEnabled(count > 0);
        boolean works = kind == HandKind.LOOK || state.isAtOpenNote();
        settings.setVisible(works);
        if (state.shot().isEmpty() || kind == HandKind.LOOK) {
            say(Words.of("hand.look.sentence"), null, null);
        } else if (works) {
            say(Words.of(retouching.live().isPresent() ? "hand." + kind.word() + ".sentence" : "hand.making"), null, null);
        } else if (state.openNote().isPresent()) {
            Note note = state.openNote().map(Listed::note).orElseThrow();
            say(Words.of("hand.elsewhere", note.frame(), note.view()), Words.of("hand.go"), this::goToNote);
        } else {
            say(Words.of("hand.noNote"), Words.of("hand.newNote"), newNote);
        }
    }

    private void say(String words, String button, Runnable run) {
        sentence.setText(words);
        sentence.setToolTipText(words);
        help.setVisible(button != null);
        if (button != null) {
            help.setText(button);
            help.setToolTipText(button);
            helping = run;
        }
    }

    private void goToNote() {
        desk.state().note().ifPresent(id -> desk.look(s -> Places.at(s, id)));
    }

    /** Takes up a hand, its settings as they were when it was put down; all brushes share theirs. */
    private void take(HandKind kind) {
        Hand usual = kind.usual();
        Hand last = before.getOrDefault(usual.getClass(), usual);
        desk.look(s -> s.withHand(last instanceof Hand.Brushing brushing ? brushing.with(kind.brush().orElseThrow()) : last));
    }

    private void brush(java.util.function.UnaryOperator<Hand.Brushing> change) {
        if (desk.state().hand() instanceof Hand.Brushing brushing) {
            desk.look(s -> s.withHand(change.apply(brushing)));
        }
    }

    private DeskAction ofBrush(String id, String key, java.util.function.UnaryOperator<Hand.Brushing> change) {
        return DeskAction.of(id, key, s -> s.shot().isPresent() && s.hand() instanceof Hand.Brushing, () -> brush(change));
    }

    /** What can be done here. */
    public List<DeskAction> actions() {
        List<DeskAction> actions = new ArrayList<>();
        for (HandKind kind : HandKind.values()) {
            actions.add(DeskAction.withShot(kind.id(), kind.key(), () -> take(kind)));
        }
        actions.add(ofBrush("hand.wider", "alt UP", b -> b.withRadius(b.radius() * WIDER)));
        actions.add(ofBrush("hand.narrower", "alt DOWN", b -> b.withRadius(b.radius() / WIDER)));
        actions.add(ofBrush("hand.stronger", "alt RIGHT", b -> b.withStrength(b.strength() + STRONGER)));
        actions.add(ofBrush("hand.weaker", "alt LEFT", b -> b.withStrength(b.strength() - STRONGER)));
        actions.add(DeskAction.of("hand.steps", "ctrl K", HandStrip::hasSteps, () -> StepsWindow.open(this, desk, retouching)));
        actions.add(DeskAction.of("hand.remove-last", "ctrl BACK_SPACE", HandStrip::hasSteps, () -> retouching.edit(Edit.REMOVE_STEP,
                operations -> operations.subList(0, operations.size() - 1))));
        actions.add(DeskAction.of("hand.remove-hold", null, s -> s.isAtOpenNote() && s.hand() instanceof Hand.Holding,
                settings::removeHold));
        return actions;
    }

    private static boolean hasSteps(DeskState state) {
        return state.isAtOpenNote() && !state.openNote().orElseThrow().note().retouch().operations().isEmpty();
    }

    /** Removes the chosen hold, if the hand holds and one is chosen. */
    public void removeChosen() {
        if (desk.state().hand() instanceof Hand.Holding) {
            settings.removeHold();
        }
    }

    /** The hands, for the right button on the picture. */
    public JPopupMenu menu() {
        JPopupMenu menu = new JPopupMenu(Words.of("hand.name"));
        menu.setName("hand-menu");
        for (HandKind kind : HandKind.values()) {
            JRadioButtonMenuItem item = new JRadioButtonMenuItem(kind.inWords(), new HandIcon(kind),
                    kind == HandKind.of(desk.state().hand()));
            item.setName("menu-" + kind.id().replace('.', '-'));
            item.setToolTipText(kind.tip());
            item.addActionListener(e -> take(kind));
            menu.add(item);
        }
        return menu;
    }
}
