package org.wispwright.ui.window.takes;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javax.swing.JPanel;
import javax.swing.JProgressBar;
import net.miginfocom.swing.MigLayout;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.desk.TakeEntry;
import org.wispwright.ui.window.Words;

/** The takes that are there, lowest number first; and the original, while it is being simulated. */
final class TakeList extends JPanel {
    private final Desk desk;
    private final Map<Integer, TakeRow> rows = new LinkedHashMap<>();
    private final Sentence making = new Sentence("original-words");
    private final JProgressBar bar = new JProgressBar();
    private final Wordy.Push again = new Wordy.Push(Words.of("action.take.simulate"));
    private List<TakeEntry> told = List.of();
    private Showing shown;

    TakeList(Desk desk) {
        super(new MigLayout("insets 0, fillx, wrap 1, hidemode 3, gapy 4", "[grow,fill]"));
        this.desk = desk;
        setName("take-list");
        setOpaque(false);
        getAccessibleContext().setAccessibleName(Words.of("takes.name"));
        bar.setName("original-bar");
        bar.getAccessibleContext().setAccessibleName(Words.of("takes.original"));
        again.setName("original-again");
        again.setToolTipText(Words.of("action.take.simulate.tip"));
        again.addActionListener(e -> desk.solving().simulateOriginal());
        add(making, "wmin 0");
        add(bar);
        add(again);
    }

    void follow(DeskState state) {
        if (state.shot().isEmpty()) {
            return;
        }
        boolean simulates = state.work().original().isPresent();
        state.work().original().ifPresent(frame -> {
            FrameRange range = state.shot().get().setup().flow().frames();
            making.say(Words.of("takes.simulating", frame.number() - range.first() + 1, range.count()));
            bar.setMaximum(range.count());
            bar.setValue(frame.number() - range.first() + 1);
        });
        bar.setVisible(simulates);
        boolean none = !simulates && state.takes().isEmpty();
        again.setVisible(none);
        if (!simulates) {
            making.say(none ? Words.of("takes.none") : "");
        }
        rows(state.takes(), state.showing().orElseThrow());
    }

    private void rows(List<TakeEntry> takes, Showing showing) {
        if (takes.equals(told) && Optional.ofNullable(shown).map(s -> s.near().equals(showing.near()) && s.far().equals(showing.far()))
                .orElse(false)) {
            return;
        }
        told = takes;
        shown = showing;
        rows.keySet().removeIf(number -> {
            boolean gone = takes.stream().noneMatch(take -> take.number() == number);
            if (gone) {
                remove(rows.get(number));
            }
            return gone;
        });
        for (TakeEntry take : takes) {
            rows.computeIfAbsent(take.number(), number -> {
                TakeRow row = new TakeRow(desk, number);
                add(row, "wmin 0");
                return row;
            }).follow(take, showing);
        }
        revalidate();
        repaint();
    }
}
