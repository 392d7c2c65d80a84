package org.wispwright.ui.window.takes;

import javax.swing.BorderFactory;
import javax.swing.JPanel;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.SolveNow;
import org.wispwright.ui.desk.TakeWork.Leaving;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** The one question that the desk asks: it is to be closed, and a solve runs. */
final class LeaveBox extends JPanel {
    private final Sentence words = new Sentence("leave-words");
    private final Wordy.Push keep = button("leave-keep");
    private final Wordy.Push stop = button("leave-stop");
    private final Wordy.Push stay = button("leave-stay");
    private Leaving told = Leaving.NO;

    LeaveBox(Desk desk) {
        super(new MigLayout("insets 0, fillx, wrap 1, hidemode 3", "[grow,fill]"));
        setOpaque(false);
        JPanel box = Column.box("leave-box", Words.of("takes.leave"));
        box.setBorder(BorderFactory.createLineBorder(Palette.ACCENT.colour(), 2));
        box.add(words, "wmin 0");
        box.add(keep, "wmin 0");
        box.add(stop, "wmin 0");
        box.add(stay, "wmin 0");
        keep.addActionListener(e -> {
            desk.solving().leaves(true);
            desk.solving().keep();
        });
        stop.addActionListener(e -> {
            desk.solving().leaves(true);
            desk.solving().stop();
        });
        stay.addActionListener(e -> desk.solving().leaves(false));
        add(box, "wmin 0");
    }

    private static Wordy.Push button(String name) {
        String key = "takes." + name.replace('-', '.');
        Wordy.Push button = new Wordy.Push(Words.of(key));
        button.setName(name);
        button.setToolTipText(Words.of(key + ".tip"));
        return button;
    }

    void follow(DeskState state) {
        Leaving leaving = state.work().leaving();
        setVisible(leaving != Leaving.NO && state.work().running().isPresent());
        words.say(Words.of(leaving == Leaving.THEN ? "takes.leave.then" : "takes.leave.words"));
        keep.setVisible(leaving == Leaving.ASKED);
        keep.setEnabled(state.work().running().map(SolveNow::canBeKept).orElse(false));
        stop.setVisible(leaving == Leaving.ASKED);
        if (leaving == Leaving.ASKED && told != Leaving.ASKED) {
            stay.requestFocusInWindow();
        }
        told = leaving;
    }
}
