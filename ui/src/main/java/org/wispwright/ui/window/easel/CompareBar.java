package org.wispwright.ui.window.easel;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.function.Consumer;
import javax.swing.DefaultComboBoxModel;
import javax.swing.JComboBox;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JSlider;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Against;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.desk.TakeEntry;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Sources;
import org.wispwright.ui.window.Words;

/** Above the picture: the view, what is shown, what it is set against and how, and the one setting that this has. */
final class CompareBar extends JPanel {
    private static final double GAIN_BASE = 1.2;

    private final Desk desk;
    private final JComboBox<String> view = new JComboBox<>();
    private final JComboBox<Named> near = new JComboBox<>();
    private final JComboBox<String> how = new JComboBox<>();
    private final JComboBox<Named> far = new JComboBox<>();
    private final JSlider fade = new JSlider(0, 100);
    private final JSlider gain = new JSlider(0, 25);
    private final JLabel caution = new JLabel(Words.of("compare.blink.caution"));
    private final JLabel gainWords = new JLabel();
    private final JPanel setting = new JPanel(new MigLayout("insets 0 0 4 0, fillx, hidemode 3", "[grow]8[]"));
    private boolean following;

    /** A source under the name it has on screen. */
    private record Named(Source source, String words) {
        @Override
        public String toString() {
            return words;
        }
    }

    CompareBar(Desk desk) {
        super(new MigLayout("insets 4 8 4 8, fillx, hidemode 3, wrap 4", "[sg,fill,grow][sg,fill,grow][sg,fill,grow][sg,fill,grow]"));
        this.desk = desk;
        for (Against each : Against.values()) {
            how.addItem(Words.of("compare." + each.name().toLowerCase(Locale.ROOT)));
        }
        control(view, "compare-view");
        control(near, "compare-near");
        control(how, "compare-how");
        control(far, "compare-far");
        setting.setOpaque(false);
        setting.add(named(fade, "compare-fade"), "growx");
        setting.add(named(gain, "compare-gain"), "growx");
        setting.add(gainWords);
        caution.setName("compare-caution");
        caution.setForeground(Palette.FAULT.colour());
        setting.add(caution, "growx");
        setting.setPreferredSize(new java.awt.Dimension(0, fade.getPreferredSize().height + Palette.STEP));   // always there: the picture must not jump
        add(setting, "span, growx");
        view.addActionListener(e -> chosen(() -> desk.show(s -> s.withView((String) view.getSelectedItem()))));
        near.addActionListener(e -> chosen(() -> desk.show(s -> s.withNear(((Named) near.getSelectedItem()).source()))));
        far.addActionListener(e -> chosen(() -> desk.show(s -> s.withFar(((Named) far.getSelectedItem()).source()))));
        how.addActionListener(e -> chosen(() -> desk.show(s -> s.withAgainst(Against.values()[how.getSelectedIndex()]))));
        fade.addChangeListener(e -> chosen(() -> desk.show(s -> s.withFade(fade.getValue() / 100.0))));
        gain.addChangeListener(e -> chosen(() -> desk.show(s -> s.withGain(Math.pow(GAIN_BASE, gain.getValue())))));
        desk.listen(this::follow);
    }

    private void control(JComboBox<?> box, String name) {
        named(box, name);
        box.setMinimumSize(new java.awt.Dimension(60, 0));
        add(box);
    }

    private static <T extends javax.swing.JComponent> T named(T control, String name) {
        control.setName(name);
        String words = Words.of(name.replace('-', '.') + ".name");
        control.getAccessibleContext().setAccessibleName(words);
        control.setToolTipText(Words.of(name.replace('-', '.') + ".tip"));
        return control;
    }

    private void chosen(Runnable change) {
        if (!following) {
            change.run();
        }
    }

    private void follow(DeskState state) {
        if (state.shot().isEmpty()) {
            return;
        }
        Showing showing = state.showing().orElseThrow();
        following = true;
        try {
            fill(view, state.shot().get().setup().views().stream().map(v -> v.view().name()).toList(), showing.view());
            List<Named> sources = sources(state);
            fill(near, sources, new Named(showing.near(), Sources.inWords(showing.near())));
            fill(far, sources, new Named(showing.far(), Sources.inWords(showing.far())));
            how.setSelectedIndex(showing.against().ordinal());
            far.setEnabled(showing.against() != Against.ALONE);
            fade.setValue((int) Math.round(100 * showing.fade()));
            gain.setValue((int) Math.round(Math.log(showing.gain()) / Math.log(GAIN_BASE)));
            gainWords.setText(Words.of("compare.gain.words", String.format(Locale.ROOT, "%.1f", showing.gain())));
            fade.setVisible(showing.against() == Against.FADE);
            gain.setVisible(showing.against() == Against.DIFFERENCE);
            gainWords.setVisible(showing.against() == Against.DIFFERENCE);
            caution.setVisible(showing.against() == Against.BLINK);
        } finally {
            following = false;
        }
    }

    private static List<Named> sources(DeskState state) {
        List<Source> all = new ArrayList<>();
        state.takes().stream().filter(TakeEntry::current).forEach(take -> all.add(new Source.Take(take.number())));
        if (state.isAtOpenNote()) {
            all.add(new Source.Wanted(state.note().orElseThrow()));
        }
        Showing showing = state.showing().orElseThrow();
        if (state.shot().orElseThrow().setup().view(showing.view()).orElseThrow().rendered().containsKey(showing.frame())) {
            all.add(new Source.Rendered());
        }
        return all.stream().map(source -> new Named(source, Sources.inWords(source))).toList();
    }

    private static <T> void fill(JComboBox<T> box, List<T> items, T chosen) {
        List<T> all = new ArrayList<>(items);
        if (!all.contains(chosen)) {
            all.add(chosen);
        }
        boolean same = box.getItemCount() == all.size();
        for (int n = 0; same && n < all.size(); n++) {
            same = all.get(n).equals(box.getItemAt(n));
        }
        if (!same) {
            DefaultComboBoxModel<T> model = new DefaultComboBoxModel<>();
            all.forEach(model::addElement);
            box.setModel(model);
        }
        Consumer<T> choose = box::setSelectedItem;
        choose.accept(chosen);
    }
}
