package org.wispwright.ui.window.start;

import java.awt.event.ActionEvent;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import javax.swing.Action;
import javax.swing.BorderFactory;
import javax.swing.JButton;
import javax.swing.JLabel;
import javax.swing.JPanel;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.FirstNote;
import org.wispwright.ui.desk.Memory;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** The guide for the first note: one line with the next step, and the button that does it. Steps that are done pass by themselves. */
public final class GuideStrip extends JPanel {
    private static final Map<FirstNote, String> ACTIONS = new EnumMap<>(Map.of(FirstNote.NOTE, "note.new", FirstNote.RETOUCH, "hand.add",
            FirstNote.HOLD, "hand.hold", FirstNote.SOLVE, "take.solve", FirstNote.COMPARE, "compare.divider"));

    private final Desk desk;
    private final Memory memory;
    private final Function<String, Action> actions;
    private final Set<FirstNote> passed = EnumSet.noneOf(FirstNote.class);
    private final JLabel count = new JLabel();
    private final JLabel words = new JLabel();
    private final JButton does = new JButton();
    private final JButton skip = new JButton(Words.of("guide.skip"));
    private final JButton leave = new JButton(Words.of("guide.leave"));
    private Optional<FirstNote> step = Optional.empty();

    /** Follows a desk. @param actions Swing's action of an id */
    public GuideStrip(Desk desk, Memory memory, Function<String, Action> actions) {
        super(new MigLayout("insets 4 8 4 8, fillx, hidemode 3", "[][grow][][][]"));
        this.desk = desk;
        this.memory = memory;
        this.actions = actions;
        setName("guide");
        getAccessibleContext().setAccessibleName(Words.of("guide.name"));
        setBackground(Palette.CARD.colour());
        setBorder(BorderFactory.createMatteBorder(1, 0, 1, 0, Palette.LINE.colour()));
        count.setFont(Palette.strong());
        words.setName("guide-words");
        does.setName("guide-do");
        skip.setName("guide-skip");
        leave.setName("guide-leave");
        for (JButton button : List.of(skip, leave)) {
            button.putClientProperty("JButton.buttonType", "borderless");
        }
        skip.setToolTipText(Words.of("guide.skip.tip"));
        leave.setToolTipText(Words.of("guide.leave.tip"));
        does.addActionListener(e -> step.ifPresent(s -> actions.apply(ACTIONS.get(s)).actionPerformed(
                new ActionEvent(this, ActionEvent.ACTION_PERFORMED, ACTIONS.get(s)))));
        skip.addActionListener(e -> {
            step.ifPresent(passed::add);
            follow(desk.state());
        });
        leave.addActionListener(e -> end());
        add(count);
        add(words, "wmin 0");
        add(does);
        add(skip);
        add(leave);
        desk.listen(this::follow);
    }

    /** What can be done here. */
    public List<DeskAction> actions() {
        return List.of(DeskAction.withShot("help.guide", "F1", this::begin));
    }

    private void begin() {
        passed.clear();
        memory.change(m -> m.withGuided(false));
        follow(desk.state());
    }

    private void end() {
        memory.change(m -> m.withGuided(true));
        follow(desk.state());
    }

    private void follow(DeskState state) {
        boolean shown = !memory.now().guided() && state.shot().isPresent();
        setVisible(shown);
        if (!shown) {
            return;
        }
        step = FirstNote.next(state, passed);
        does.setVisible(step.isPresent());
        skip.setVisible(step.isPresent());
        leave.setText(Words.of(step.isPresent() ? "guide.leave" : "guide.end"));
        if (step.isEmpty()) {
            count.setText(Words.of("guide.done"));
            words.setText(Words.of("guide.done.words"));
            return;
        }
        String key = "guide." + step.get().name().toLowerCase(Locale.ROOT);
        count.setText(Words.of("guide.step", step.get().ordinal() + 1, FirstNote.values().length));
        words.setText(Words.of(key));
        words.setToolTipText(Words.of(key));
        Action action = actions.apply(ACTIONS.get(step.get()));
        does.setText(String.valueOf(action.getValue(Action.NAME)));
        does.setToolTipText(String.valueOf(action.getValue(Action.SHORT_DESCRIPTION)));
        does.setEnabled(action.isEnabled());
    }
}
