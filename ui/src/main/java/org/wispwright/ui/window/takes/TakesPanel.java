package org.wispwright.ui.window.takes;

import java.awt.BorderLayout;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import javax.swing.BorderFactory;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.ScrollPaneConstants;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.SolveNow;
import org.wispwright.ui.desk.Solving;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.desk.TakeEntry;
import org.wispwright.ui.desk.TakeWork.Leaving;
import org.wispwright.ui.desk.WritingOut;
import org.wispwright.ui.job.Quality;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** Shows the takes, the solve that runs or could, and what can be written out. */
public final class TakesPanel extends JPanel {
    private final Desk desk;
    private final LeaveBox leave;
    private final TakeList list;
    private final RunBox run;
    private final SolveBox solve;
    private final WriteBox write;
    private final JScrollPane scroll;
    private Runnable leaves = () -> { };
    private boolean ran;

    /** Follows a desk. */
    public TakesPanel(Desk desk) {
        super(new BorderLayout());
        this.desk = desk;
        setName("takes");
        setBackground(Palette.PANEL.colour());
        getAccessibleContext().setAccessibleName(Words.of("takes.name"));
        leave = new LeaveBox(desk);
        list = new TakeList(desk);
        run = new RunBox(desk);
        solve = new SolveBox(desk);
        write = new WriteBox(desk);
        Column column = new Column();
        for (JPanel part : List.of(leave, run, list, solve, write)) {
            column.add(part, "wmin 0");
        }
        scroll = new JScrollPane(column, ScrollPaneConstants.VERTICAL_SCROLLBAR_AS_NEEDED, ScrollPaneConstants.HORIZONTAL_SCROLLBAR_NEVER);
        scroll.setName("takes-scroll");
        scroll.setBorder(BorderFactory.createEmptyBorder());
        add(scroll, BorderLayout.CENTER);
        desk.listen(this::follow);
    }

    /**
     * True if the desk may be closed now; else the person is asked here, as a solve runs.
     *
     * @param then closes it, once the person has said so and the solve has ended
     */
    public boolean mayClose(Runnable then) {
        leaves = then;
        boolean may = desk.solving().mayLeave();
        if (!may) {
            scroll.getVerticalScrollBar().setValue(0);
        }
        return may;
    }

    /** Has folders to write into chosen in another way than by a dialog. */
    public void chooseFoldersBy(Supplier<Optional<Path>> chooser) {
        write.chooseBy(chooser);
    }

    /** What can be done here. */
    public List<DeskAction> actions() {
        Solving solving = desk.solving();
        List<DeskAction> all = new ArrayList<>(List.of(
                DeskAction.of("take.solve", "ctrl ENTER", Solving::canStart, solving::start),
                DeskAction.of("take.pause", "ctrl shift ENTER", s -> running(s).map(n -> n.canBePaused() || n.canGoOn()).orElse(false),
                        () -> solving.pause(!running(desk.state()).map(SolveNow::canGoOn).orElse(true))),
                DeskAction.of("take.keep", "ctrl shift K", s -> running(s).map(SolveNow::canBeKept).orElse(false), solving::keep),
                DeskAction.of("take.stop", null, s -> running(s).map(n -> n.wish() != SolveNow.Wish.STOP).orElse(false), solving::stop),
                DeskAction.of("take.resume", null, Solving::canResume, solving::resume),
                DeskAction.of("take.drop", null, s -> s.work().unfinished().isPresent() && running(s).isEmpty(), solving::dropUnfinished),
                DeskAction.of("take.next", "ctrl shift RIGHT", s -> next(s, 1).isPresent(), () -> show(1)),
                DeskAction.of("take.previous", "ctrl shift LEFT", s -> next(s, -1).isPresent(), () -> show(-1)),
                DeskAction.of("take.against", "ctrl shift A", s -> s.takeShown().isPresent(),
                        () -> desk.show(s -> s.withFar(s.near())))));
        for (Quality quality : Quality.values()) {
            all.add(DeskAction.withShot("take.quality-" + SolveBox.word(quality), null, () -> solving.choose(c -> c.with(quality))));
        }
        all.addAll(List.of(
                DeskAction.of("take.sources", null, s -> s.shot().map(o -> !o.setup().flow().sources().isEmpty()).orElse(false),
                        () -> solving.choose(c -> c.withSources(!c.sources()))),
                DeskAction.of("take.onwards", null, s -> s.takeShown().map(t -> t.number() > 0).orElse(false),
                        () -> solving.choose(c -> c.withOnwards(!c.onwards()))),
                DeskAction.of("take.simulate", null, s -> s.shot().isPresent() && s.takes().isEmpty() && s.work().original().isEmpty(),
                        solving::simulateOriginal),
                DeskAction.of("take.write-pictures", null, WritingOut::can, () -> write.writePictures(true)),
                DeskAction.of("take.write-frame", null, WritingOut::can, () -> write.writePictures(false)),
                DeskAction.of("take.write-sheet", null, WritingOut::canSheet, write::writeSheet),
                DeskAction.of("take.write-files", null, WritingOut::can, write::writeFiles),
                DeskAction.of("take.write-stop", null, s -> s.work().writing().isPresent(), desk.writingOut()::stop)));
        return all;
    }

    private static Optional<SolveNow> running(DeskState s) {
        return s.work().running();
    }

    /** The take that can be shown so many places on in the list. */
    private static Optional<TakeEntry> next(DeskState s, int by) {
        List<TakeEntry> there = s.takes().stream().filter(TakeEntry::current).toList();
        int at = s.takeShown().map(there::indexOf).orElse(by > 0 ? -1 : there.size()) + by;
        return at >= 0 && at < there.size() ? Optional.of(there.get(at)) : Optional.empty();
    }

    private void show(int by) {
        next(desk.state(), by).ifPresent(take -> desk.show(s -> s.withNear(new Source.Take(take.number()))));
    }

    private void follow(DeskState state) {
        leave.follow(state);
        list.follow(state);
        run.follow(state);
        solve.follow(state);
        write.follow(state);
        boolean runs = state.work().running().isPresent();
        if (runs && !ran) {
            scroll.getVerticalScrollBar().setValue(0);                         // what was asked for is seen
        }
        ran = runs;
        if (!runs && state.work().leaving() == Leaving.THEN) {
            desk.workers().onDesk(leaves);
            leaves = () -> { };
        }
    }
}
