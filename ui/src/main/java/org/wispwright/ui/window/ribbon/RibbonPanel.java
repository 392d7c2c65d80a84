package org.wispwright.ui.window.ribbon;

import java.text.DecimalFormat;
import java.text.DecimalFormatSymbols;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Predicate;
import javax.swing.JButton;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.Timer;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Places;
import org.wispwright.ui.desk.Play;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.LineIcon;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** The frames along the range, and the ways over them. */
public final class RibbonPanel extends JPanel {
    private static final int TICK_MILLIS = 5;

    private final Desk desk;
    private final Play play;
    private final RibbonStrip strip;
    private final JLabel said = new JLabel();
    private final Map<DeskAction, JButton> buttons = new LinkedHashMap<>();
    private final List<DeskAction> actions;

    /** Follows a desk. */
    public RibbonPanel(Desk desk) {
        super(new MigLayout("insets 4 8 4 8, fill", "[]8[grow, fill]", "[grow, fill]"));
        this.desk = desk;
        setName("ribbon");
        setBackground(Palette.PANEL.colour());
        getAccessibleContext().setAccessibleName(Words.of("ribbon.name"));
        play = new Play(desk, System::nanoTime, tick -> {
            Timer timer = new Timer(TICK_MILLIS, e -> tick.run());
            timer.start();
            return timer::stop;
        }, this::told);
        strip = new RibbonStrip(desk);
        Predicate<DeskState> before = s -> Places.nearest(s, false).isPresent();
        Predicate<DeskState> after = s -> Places.nearest(s, true).isPresent();
        actions = List.of(
                DeskAction.withShot("frame.first", "HOME", () -> go(Integer.MIN_VALUE)),
                DeskAction.of("frame.previous-note", "shift COMMA", before, () -> goToNote(false)),
                DeskAction.withShot("frame.previous", "COMMA", () -> go(shown() - 1)),
                DeskAction.withShot("frame.play", "SPACE", play::toggle),
                DeskAction.withShot("frame.next", "PERIOD", () -> go(shown() + 1)),
                DeskAction.of("frame.next-note", "shift PERIOD", after, () -> goToNote(true)),
                DeskAction.withShot("frame.last", "END", () -> go(Integer.MAX_VALUE)));
        add(controls(), "aligny top");
        add(strip, "wmin 0");
        desk.listen(this::follow);
    }

    private JPanel controls() {
        LineIcon[] icons = {LineIcon.FIRST, LineIcon.PREVIOUS_NOTE, LineIcon.PREVIOUS, LineIcon.PLAY, LineIcon.NEXT, LineIcon.NEXT_NOTE,
            LineIcon.LAST};
        JPanel row = new JPanel(new MigLayout("insets 0, gapx 0"));
        row.setOpaque(false);
        for (int n = 0; n < icons.length; n++) {
            DeskAction action = actions.get(n);
            JButton button = new JButton(icons[n]);
            button.setName(action.id().replace('.', '-'));
            button.getAccessibleContext().setAccessibleName(Words.of("action." + action.id()));
            button.setToolTipText(action.tip());
            button.putClientProperty("JButton.buttonType", "toolBarButton");
            button.addActionListener(e -> action.run().run());
            buttons.put(action, button);
            row.add(button);
        }
        said.setName("ribbon-said");
        said.setFont(Palette.small());
        said.setForeground(Palette.QUIET.colour());
        said.setToolTipText(Words.of("ribbon.said.tip"));
        JPanel both = new JPanel(new MigLayout("insets 0, wrap 1, gapy 4"));
        both.setOpaque(false);
        both.add(row);
        both.add(said, "gapx 4, wmin 0");
        return both;
    }

    /** What can be done here. */
    public List<DeskAction> actions() {
        return actions;
    }

    private int shown() {
        return desk.state().showing().orElseThrow().frame();
    }

    private void go(int frame) {
        desk.look(s -> Places.onFrame(s, frame));
    }

    private void goToNote(boolean on) {
        Optional<String> note = Places.nearest(desk.state(), on);
        note.ifPresent(id -> desk.look(s -> Places.at(s, id)));
    }

    private void follow(DeskState state) {
        buttons.forEach((action, button) -> button.setEnabled(action.enabled().test(state)));
        strip.follow(state);
        told();
    }

    private void told() {
        JButton button = buttons.get(actions.get(3));
        button.setIcon(play.isPlaying() ? LineIcon.PAUSE : LineIcon.PLAY);
        desk.state().shot().ifPresent(shot -> {
            String rate = new DecimalFormat("0.##", DecimalFormatSymbols.getInstance(Locale.ROOT))
                    .format(shot.setup().flow().frames().perSecond());
            said.setText(play.isPlaying() ? Words.of("ribbon.playing", rate, play.dropped()) : Words.of("ribbon.rate",
                    shot.setup().flow().frames().count(), rate));
        });
    }
}
