package org.wispwright.ui.window.easel;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import javax.swing.JButton;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JSpinner;
import javax.swing.SpinnerNumberModel;
import net.miginfocom.swing.MigLayout;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.solve.SolveProblem.Span;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.ui.desk.Retouching.Edit;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.WarpKind;

/** The two or three settings of the hand, and no others; of a hold that is chosen, its frames. */
final class HandSettings extends JPanel {
    private static final double PERCENT = 100;

    private final Desk desk;
    private final Retouching retouching;
    private final JSpinner radius = percent("radius", 0.2, 100, 0.5);
    private final JSpinner strength = percent("strength", 0, 100, 5);
    private final JSpinner softEdge = percent("soft-edge", 0, 100, 5);
    private final JComboBox<String> mesh = new JComboBox<>();
    private final JSpinner level = percent("level", 1, 99, 5);
    private final JSpinner reach = percent("reach", 1, 200, 5);
    private final JComboBox<String> form = new JComboBox<>();
    private final JSpinner feather = percent("feather", 0, 100, 1);
    private final JSpinner first = new JSpinner(new SpinnerNumberModel(0, 0, 0, 1));
    private final JSpinner last = new JSpinner(new SpinnerNumberModel(0, 0, 0, 1));
    private final JButton removeHold = new JButton(Words.of("action.hand.remove-hold"));
    private final List<JComponent> brushParts = new ArrayList<>();
    private final List<JComponent> meshParts = new ArrayList<>();
    private final List<JComponent> outlineParts = new ArrayList<>();
    private final List<JComponent> holdParts = new ArrayList<>();
    private final List<JComponent> frameParts = new ArrayList<>();
    private boolean following;

    HandSettings(Desk desk, Retouching retouching) {
        super(new MigLayout("insets 0, hidemode 3, gapx 4"));
        this.desk = desk;
        this.retouching = retouching;
        setOpaque(false);
        for (WarpKind kind : WarpKind.values()) {
            mesh.addItem(inWords(kind));
        }
        for (Hand.Form one : Hand.Form.values()) {
            form.addItem(Words.of("hold.form." + one.name().toLowerCase(Locale.ROOT)));
        }
        part(radius, "radius", brushParts);
        part(strength, "strength", brushParts);
        part(softEdge, "soft-edge", brushParts);
        part(mesh, "mesh", meshParts);
        part(level, "level", outlineParts);
        part(reach, "reach", outlineParts);
        part(form, "form", holdParts);
        part(feather, "feather", holdParts);
        part(first, "hold-first", frameParts);
        part(last, "hold-last", frameParts);
        first.setEditor(new JSpinner.NumberEditor(first, "0"));
        last.setEditor(new JSpinner.NumberEditor(last, "0"));
        removeHold.setName("hand-remove-hold");
        removeHold.setToolTipText(Words.of("action.hand.remove-hold.tip"));
        frameParts.add(removeHold);
        add(removeHold);
        radius.addChangeListener(e -> brush(b -> b.withRadius(share(radius))));
        strength.addChangeListener(e -> brush(b -> b.withStrength(share(strength))));
        softEdge.addChangeListener(e -> brush(b -> b.withSoftEdge(share(softEdge))));
        mesh.addActionListener(e -> chosen(this::chooseMesh));
        level.addChangeListener(e -> chosen(this::chooseOutline));
        reach.addChangeListener(e -> chosen(this::chooseOutline));
        form.addActionListener(e -> chosen(this::chooseHold));
        feather.addChangeListener(e -> chosen(this::chooseHold));
        first.addChangeListener(e -> chosen(() -> frames((int) first.getValue(), Math.max((int) first.getValue(), (int) last.getValue()))));
        last.addChangeListener(e -> chosen(() -> frames(Math.min((int) first.getValue(), (int) last.getValue()), (int) last.getValue())));
        removeHold.addActionListener(e -> removeHold());
    }

    private static JSpinner percent(String name, double least, double most, double step) {
        JSpinner spinner = new JSpinner(new SpinnerNumberModel(least, least, most, step));
        spinner.setEditor(new JSpinner.NumberEditor(spinner, "0.#"));
        ((JSpinner.NumberEditor) spinner.getEditor()).getTextField().setColumns(3);
        spinner.setName("hand-" + name);
        return spinner;
    }

    private void part(JComponent control, String name, List<JComponent> group) {
        JLabel label = new JLabel(Words.of("hand." + name));
        label.setLabelFor(control);
        control.setName("hand-" + name);
        control.setToolTipText(Words.of("hand." + name + ".tip"));
        control.getAccessibleContext().setAccessibleName(Words.of("hand." + name));
        if (control instanceof JSpinner spinner && spinner.getEditor() instanceof JSpinner.DefaultEditor editor) {
            editor.getTextField().getAccessibleContext().setAccessibleName(Words.of("hand." + name));
            editor.getTextField().setToolTipText(Words.of("hand." + name + ".tip"));
        }
        group.add(label);
        group.add(control);
        add(label);
        add(control);
    }

    static String inWords(WarpKind kind) {
        return Words.of("mesh." + kind.name().toLowerCase(Locale.ROOT).replace('_', '-'));
    }

    private static double share(JSpinner spinner) {
        return ((Number) spinner.getValue()).doubleValue() / PERCENT;
    }

    private void chosen(Runnable change) {
        if (!following) {
            change.run();
        }
    }

    private void brush(java.util.function.UnaryOperator<Hand.Brushing> change) {
        if (!following && desk.state().hand() instanceof Hand.Brushing brushing) {
            desk.look(s -> s.withHand(change.apply(brushing)));
        }
    }

    /** The mesh that the next handle goes to: the note's last operation, if it is one. */
    private Optional<MeshWarp> meshAtHand() {
        List<Operation> operations = retouching.operations();
        return operations.isEmpty() || !(operations.get(operations.size() - 1) instanceof MeshWarp warp) ? Optional.empty()
                : Optional.of(warp);
    }

    private void chooseMesh() {
        WarpKind kind = WarpKind.values()[mesh.getSelectedIndex()];
        desk.look(s -> s.withHand(new Hand.Pulling(kind)));
        meshAtHand().filter(warp -> warp.kind() != kind).ifPresent(warp -> {
            if (warp.handles().size() < kind.fewestHandles()) {
                desk.say(org.wispwright.ui.desk.Message.Kind.NOTICE, Words.of("hand.pull.fewest", kind.fewestHandles()));
                follow(desk.state());
                return;
            }
            retouching.edit(Edit.CHANGE_MESH, operations -> {
                List<Operation> changed = new ArrayList<>(operations);
                changed.set(changed.size() - 1, new MeshWarp(kind, warp.handles(), warp.cells(), warp.within()));
                return changed;
            });
        });
    }

    private void chooseOutline() {
        desk.look(s -> s.withHand(new Hand.Outlining(share(level), share(reach))));
    }

    private void chooseHold() {
        desk.look(s -> s.withHand(new Hand.Holding(Hand.Form.values()[form.getSelectedIndex()], share(feather))));
    }

    private Optional<Hold> chosenHold() {
        OptionalInt chosen = retouching.chosenHold();
        return chosen.isEmpty() ? Optional.empty() : retouching.note().map(Note::holds).filter(holds -> chosen.getAsInt() < holds.size())
                .map(holds -> holds.get(chosen.getAsInt()));
    }

    private void frames(int from, int to) {
        int at = retouching.chosenHold().orElse(-1);
        retouching.holds(Edit.HOLD_FRAMES, holds -> {
            List<Hold> changed = new ArrayList<>(holds);
            Hold hold = holds.get(at);
            changed.set(at, new Hold(hold.region(), hold.view(), List.of(new Span(from, to)), hold.held(), hold.weight()));
            return changed;
        });
    }

    /** Removes the chosen hold, if one is. */
    void removeHold() {
        chosenHold().ifPresent(hold -> {
            int at = retouching.chosenHold().orElseThrow();
            retouching.choose(OptionalInt.empty());
            retouching.holds(Edit.REMOVE_HOLD, holds -> {
                List<Hold> fewer = new ArrayList<>(holds);
                fewer.remove(at);
                return fewer;
            });
        });
    }

    /** Shows the settings of the state's hand. */
    void follow(DeskState state) {
        following = true;
        try {
            Hand hand = state.hand();
            show(brushParts, hand instanceof Hand.Brushing);
            show(meshParts, hand instanceof Hand.Pulling);
            show(outlineParts, hand instanceof Hand.Outlining);
            Optional<Hold> hold = hand instanceof Hand.Holding ? chosenHold() : Optional.empty();
            show(holdParts, hand instanceof Hand.Holding && hold.isEmpty());
            show(frameParts, hold.isPresent());
            if (hand instanceof Hand.Brushing brushing) {
                set(radius, brushing.radius());
                set(strength, brushing.strength());
                set(softEdge, brushing.softEdge());
            } else if (hand instanceof Hand.Pulling pulling) {
                mesh.setSelectedIndex(meshAtHand().map(MeshWarp::kind).orElse(pulling.kind()).ordinal());
            } else if (hand instanceof Hand.Outlining outlining) {
                set(level, outlining.level());
                set(reach, outlining.reach());
            } else if (hand instanceof Hand.Holding holding) {
                form.setSelectedIndex(holding.form().ordinal());
                set(feather, holding.feather());
                hold.ifPresent(h -> frames(state.shot().orElseThrow().setup().flow().frames(), h));
            }
        } finally {
            following = false;
        }
    }

    private void frames(FrameRange range, Hold hold) {
        int from = hold.spans().stream().mapToInt(Span::first).min().orElseThrow();
        int to = hold.spans().stream().mapToInt(Span::last).max().orElseThrow();
        set(first, range, from);
        set(last, range, to);
    }

    private static void set(JSpinner spinner, FrameRange range, int frame) {
        SpinnerNumberModel model = (SpinnerNumberModel) spinner.getModel();
        model.setMinimum(Math.min(frame, range.first()));
        model.setMaximum(Math.max(frame, range.last()));
        if (!model.getValue().equals(frame)) {
            model.setValue(frame);
        }
    }

    private static void show(List<JComponent> group, boolean shown) {
        group.forEach(part -> part.setVisible(shown));
    }

    private static void set(JSpinner spinner, double share) {
        double percent = Math.round(share * PERCENT * 10) / 10.0;
        if (((Number) spinner.getValue()).doubleValue() != percent) {
            spinner.setValue(percent);
        }
    }
}
