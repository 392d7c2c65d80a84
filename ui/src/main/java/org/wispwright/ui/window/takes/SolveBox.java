package org.wispwright.ui.window.takes;

import java.util.EnumMap;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;
import javax.swing.ButtonGroup;
import javax.swing.JComponent;
import javax.swing.JPanel;
import javax.swing.JRadioButton;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Solving;
import org.wispwright.ui.desk.TakeWork;
import org.wispwright.ui.desk.Unfinished;
import org.wispwright.ui.job.Estimate;
import org.wispwright.ui.job.Quality;
import org.wispwright.ui.job.SmokeAsked;
import org.wispwright.ui.shot.MemoryNeed;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** How the next solve is asked for, what it would take, and the button; a solve that was cut off comes first. */
final class SolveBox extends JPanel {
    private final Map<Quality, JRadioButton> qualities = new EnumMap<>(Quality.class);
    private final Map<Quality, Sentence> costs = new EnumMap<>(Quality.class);
    private final Wordy.Check sources = new Wordy.Check(Words.of("takes.sources"));
    private final Wordy.Check onwards = new Wordy.Check("");
    private final Sentence asked = new Sentence("smoke-asked").in(Palette.WANTED.colour());
    private final Sentence why = new Sentence("estimate-why").in(Palette.FAULT.colour());
    private final Sentence cut = new Sentence("unfinished-words");
    private final Sentence idle = new Sentence("solve-why").in(Palette.QUIET.colour());
    private final Wordy.Push solve = button("take.solve");
    private final Wordy.Push resume = button("take.resume");
    private final Wordy.Push drop = button("take.drop");

    SolveBox(Desk desk) {
        super(new MigLayout("insets 0, fillx, wrap 1, hidemode 3", "[grow,fill]"));
        setOpaque(false);
        JPanel box = Column.box("solve-box", Words.of("takes.solve"));
        box.add(cut, "wmin 0");
        box.add(resume, "wmin 0");
        box.add(drop, "wmin 0");
        ButtonGroup one = new ButtonGroup();
        for (Quality quality : Quality.values()) {
            String word = word(quality);
            JRadioButton button = new JRadioButton(Words.of("takes.quality." + word));
            named(button, "quality-" + word, Words.of("action.take.quality-" + word + ".tip"));
            button.addActionListener(e -> desk.solving().choose(c -> c.with(quality)));
            one.add(button);
            qualities.put(quality, button);
            costs.put(quality, new Sentence("cost-" + word).in(Palette.QUIET.colour()));
            box.add(button, "wmin 0");
            box.add(costs.get(quality), "wmin 0, gapleft 24");
        }
        box.add(why, "wmin 0");
        box.add(asked, "wmin 0");
        named(sources, "solve-sources", Words.of("action.take.sources.tip"));
        sources.addActionListener(e -> desk.solving().choose(c -> c.withSources(sources.isSelected())));
        box.add(sources, "wmin 0");
        named(onwards, "solve-onwards", Words.of("action.take.onwards.tip"));
        onwards.addActionListener(e -> desk.solving().choose(c -> c.withOnwards(onwards.isSelected())));
        box.add(onwards, "wmin 0");
        box.add(solve, "wmin 0");
        box.add(idle, "wmin 0");
        solve.addActionListener(e -> desk.solving().start());
        resume.addActionListener(e -> desk.solving().resume());
        drop.addActionListener(e -> desk.solving().dropUnfinished());
        add(box, "wmin 0");
    }

    static Wordy.Push button(String action) {
        Wordy.Push button = new Wordy.Push(Words.of("action." + action));
        named(button, action.replace('.', '-'), Words.of("action." + action + ".tip"));
        return button;
    }

    private static void named(JComponent control, String name, String tip) {
        control.setName(name);
        control.setOpaque(false);
        control.setToolTipText(tip);
    }

    static String word(Quality quality) {
        return quality.name().toLowerCase(Locale.ROOT);
    }

    void follow(DeskState state) {
        TakeWork work = state.work();
        setVisible(work.running().isEmpty());
        if (!isVisible() || state.shot().isEmpty()) {
            return;
        }
        boolean free = work.unfinished().isEmpty();
        cut.say(work.unfinished().map(SolveBox::words).orElse(""));
        resume.setVisible(!free);
        resume.setEnabled(Solving.canResume(state));
        resume.say(work.unfinished().filter(u -> u.iterations() > 0).map(u -> Words.of("takes.resume", u.iterations()))
                .orElse(Words.of("action.take.resume")));
        drop.setVisible(!free);
        qualities.get(work.choice().quality()).setSelected(true);
        costs.forEach((quality, cost) -> cost.say(cost(work.foretold(), quality)));
        why.say(work.foretold().why().orElse(""));
        asked.say(work.asked().stream().map(SolveBox::words).collect(Collectors.joining(" ")));
        sources.setSelected(work.choice().sources());
        sources.setVisible(!state.shot().get().setup().flow().sources().isEmpty());
        sources.setEnabled(free);
        int shown = state.takeShown().map(take -> take.number()).orElse(0);
        onwards.setVisible(shown > 0);
        onwards.setEnabled(free);
        onwards.say(Words.of("takes.onwards", shown));
        onwards.setSelected(work.choice().onwards());
        solve.setEnabled(Solving.canStart(state));
        idle.say(!state.hasOriginal() ? Words.of("takes.idle.original")
                : state.shot().get().asItIs().notes().isEmpty() ? Words.of("takes.idle.notes") : "");
    }

    private static String words(Unfinished cut) {
        return switch (cut.state()) {
            case READY -> Words.of("takes.unfinished", cut.iterations());
            case OTHER_SHOT -> Words.of("takes.unfinished.other", cut.iterations());
            case DAMAGED -> Words.of("takes.unfinished.damaged");
        };
    }

    private static String words(SmokeAsked smoke) {
        return Words.of(smoke.depth() > 1 ? "takes.smoke.more" : "takes.smoke.less", smoke.note().id(),
                Amounts.percent(Math.abs(smoke.depth() - 1)));
    }

    private static String cost(TakeWork.Foretold foretold, Quality quality) {
        if (foretold.measuring()) {
            return Words.of("takes.cost.measuring");
        }
        return foretold.estimates().stream().filter(e -> e.quality() == quality).findFirst().map(SolveBox::words).orElse("");
    }

    private static String words(Estimate e) {
        return Words.of("takes.cost", Amounts.about(e.seconds()), MemoryNeed.inWords(e.memoryBytes()), MemoryNeed.inWords(e.takeBytes()));
    }
}
