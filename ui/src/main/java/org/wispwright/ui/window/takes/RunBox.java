package org.wispwright.ui.window.takes;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.swing.JPanel;
import net.miginfocom.swing.MigLayout;
import org.wispwright.optimize.solve.Progress;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.SolveNow;
import org.wispwright.ui.desk.SolveNow.Phase;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** The solve that runs: where it is, its loss, how far each note is met, what the frame looks like now; and what can be done to it. */
final class RunBox extends JPanel {
    private final Sentence where = new Sentence("solve-where");
    private final Sentence left = new Sentence("solve-left");
    private final Sentence differs = new Sentence("solve-differs").in(Palette.WANTED.colour());
    private final LossCurve curve = new LossCurve();
    private final JPanel mets = new JPanel(new MigLayout("insets 0, fillx, wrap 1, gapy 4", "[grow,fill]"));
    private final List<MetBar> bars = new ArrayList<>();
    private final GotPicture got = new GotPicture();
    private final Sentence gotWords = new Sentence("solve-got-words").in(Palette.QUIET.colour());
    private final Wordy.Push pause = SolveBox.button("take.pause");
    private final Wordy.Push keep = SolveBox.button("take.keep");
    private final Wordy.Push stop = SolveBox.button("take.stop");

    RunBox(Desk desk) {
        super(new MigLayout("insets 0, fillx, wrap 1, hidemode 3", "[grow,fill]"));
        setOpaque(false);
        mets.setOpaque(false);
        JPanel box = Column.box("run-box", Words.of("takes.running"));
        for (javax.swing.JComponent part : List.of(where, left)) {
            box.add(part, "wmin 0");
        }
        box.add(pause, "wmin 0");
        box.add(keep, "wmin 0");
        box.add(stop, "wmin 0");
        for (javax.swing.JComponent part : List.of(differs, mets, curve, gotWords, got)) {
            box.add(part, "wmin 0");
        }
        pause.addActionListener(e -> desk.solving().pause(!desk.state().work().running().map(SolveNow::canGoOn).orElse(true)));
        keep.addActionListener(e -> desk.solving().keep());
        stop.addActionListener(e -> desk.solving().stop());
        add(box, "wmin 0");
    }

    void follow(DeskState state) {
        Optional<SolveNow> running = state.work().running();
        setVisible(running.isPresent());
        if (running.isEmpty()) {
            return;
        }
        SolveNow now = running.get();
        where.say(where(now, state));
        left.say(now.at().filter(at -> now.phase() == Phase.SEARCHING).map(at -> Words.of("takes.left", Amounts.duration(at.seconds()),
                Amounts.about(at.secondsLeft()))).orElse(""));
        pause.say(Words.of(now.canGoOn() ? "takes.go-on" : "action.take.pause"));
        pause.setEnabled(now.canBePaused() || now.canGoOn());
        keep.setEnabled(now.canBeKept());
        stop.setEnabled(now.wish() != SolveNow.Wish.STOP);
        differs.say(state.shot().map(now::isOfOtherNotesThan).orElse(false) ? Words.of("takes.differs") : "");
        curve.setVisible(now.curve().size() > 1);
        curve.show(now.curve());
        mets(now);
        Note shown = now.notes().stream().filter(note -> state.note().map(note.id()::equals).orElse(false)).findFirst()
                .orElse(now.notes().get(0));
        got.setVisible(now.got().containsKey(shown.id()));
        gotWords.say(Optional.ofNullable(now.got().get(shown.id())).map(picture -> {
            String words = Words.of("takes.got", shown.id(), picture.width(), picture.height());
            got.show(words, picture, now.shot().setup().background());
            return words;
        }).orElse(""));
    }

    private void mets(SolveNow now) {
        List<Double> met = now.at().map(Progress::met).orElse(List.of());
        if (bars.size() != met.size()) {
            mets.removeAll();
            bars.clear();
            for (int n = 0; n < met.size(); n++) {
                MetBar bar = new MetBar();
                bar.setName("solve-met-" + now.notes().get(n).id());
                bars.add(bar);
                mets.add(bar, "wmin 0");
            }
            revalidate();
        }
        for (int n = 0; n < met.size(); n++) {
            bars.get(n).show(now.notes().get(n).id(), met.get(n));
        }
    }

    private static String where(SolveNow now, DeskState state) {
        String shot = state.shot().map(s -> s.folder().root().equals(now.shot().folder().root())).orElse(false) ? ""
                : Words.of("takes.of-shot", now.shot().setup().name()) + " ";
        return shot + switch (now.wish()) {
            case STOP -> Words.of("takes.stopping");
            case KEEP -> now.phase() == Phase.WRITING ? writing(now) : Words.of("takes.keeping");
            case PAUSE -> now.phase() == Phase.PAUSED ? Words.of("takes.paused", at(now)) : Words.of("takes.pausing");
            case GO_ON -> switch (now.phase()) {
                case STARTING -> Words.of("takes.starting");
                case WRITING -> writing(now);
                default -> at(now);
            };
        };
    }

    private static String at(SolveNow now) {
        return now.at().map(at -> Words.of("takes.at", at.rung(), at.rungs(), at.band(), at.bands(), at.iteration())).orElse("");
    }

    private static String writing(SolveNow now) {
        return now.frame().map(frame -> Words.of("takes.writing-take.frame", frame.number(), frame.last()))
                .orElse(Words.of("takes.writing-take"));
    }
}
