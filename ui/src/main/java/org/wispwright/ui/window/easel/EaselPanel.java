package org.wispwright.ui.window.easel;

import java.awt.BorderLayout;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.function.UnaryOperator;
import javax.swing.BorderFactory;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.SwingConstants;
import javax.swing.Timer;
import org.wispwright.ui.desk.Against;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.desk.Showing.Divider;
import org.wispwright.ui.shot.ShotView;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** The middle of the desk: the picture, what it is set against, and the hand of the moment. */
public final class EaselPanel extends JPanel {
    /**
     * How long each of two pictures is shown in turn, milliseconds: 0.7 flashes a second, far below the three that WCAG 2.x, 2.3.1 allows.
     */
    static final int TURN_MILLIS = 700;
    private static final double STEP = 1.25;
    private static final double DIVIDER_STEP = 0.05;

    private final Desk desk;
    private final EaselPictures pictures;
    private final EaselCanvas canvas;
    private final ReadOut readOut;
    private final JLabel missing = new JLabel("", SwingConstants.CENTER);
    private final Timer turning;
    private final Retouching retouching;
    private final HandStrip strip;
    private Hand held;
    private DeskState seen;
    private double toneStops;
    private double toneGamma = 1;

    /**
     * Follows a desk.
     *
     * @param retouching the open note's retouch
     * @param newNote    makes a note on the frame and in the view that are shown
     */
    public EaselPanel(Desk desk, Retouching retouching, Runnable newNote) {
        super(new BorderLayout());
        this.desk = desk;
        this.retouching = retouching;
        setName("easel");
        setBackground(Palette.PANEL.colour());
        getAccessibleContext().setAccessibleName(Words.of("easel.name"));
        pictures = new EaselPictures(desk, this::shown, missing::setText);
        canvas = new EaselCanvas(desk, pictures);
        readOut = new ReadOut(desk, canvas, pictures);
        canvas.whenPlaced(readOut::placed);
        turning = new Timer(TURN_MILLIS, e -> canvas.turn());
        strip = new HandStrip(desk, retouching, newNote);
        new EaselPointing(desk, canvas, readOut::at, strip::menu);
        canvas.use(new KeyPointer(canvas, canvas, canvas::tool, () -> !(desk.state().hand() instanceof Hand.Looking), strip::removeChosen));
        missing.setName("easel-missing");
        missing.setBorder(BorderFactory.createEmptyBorder(4, 8, 4, 8));
        missing.setForeground(Palette.FAULT.colour());
        JPanel middle = new JPanel(new BorderLayout());
        middle.add(missing, BorderLayout.NORTH);
        middle.add(canvas, BorderLayout.CENTER);
        add(new CompareBar(desk), BorderLayout.NORTH);
        add(middle, BorderLayout.CENTER);
        JPanel below = new JPanel(new BorderLayout());
        below.add(strip, BorderLayout.NORTH);
        below.add(readOut, BorderLayout.SOUTH);
        add(below, BorderLayout.SOUTH);
        desk.listen(this::follow);
    }

    /** The open note's retouch, with edits named in our words. */
    public static Retouching retouching(Desk desk) {
        return new Retouching(desk, Tools::inWords);
    }

    @Override
    public void removeNotify() {
        turning.stop();
        super.removeNotify();
    }

    private void shown() {
        missing.setVisible(!missing.getText().isEmpty());
        canvas.repaint();
    }

    private void follow(DeskState state) {
        DeskState before = seen;
        seen = state;
        if (before != null && onlyTheDivider(before, state)) {
            canvas.dividerMoved(before.showing().orElseThrow().divider());
            return;
        }
        pictures.follow(state);
        if (held == null || !Tools.areOne(held, state.hand())) {
            held = state.hand();
            canvas.use(Tools.of(held, desk, retouching, canvas));
        }
        boolean turns = state.showing().map(s -> s.against() == Against.BLINK).orElse(false);
        if (turns != turning.isRunning()) {
            if (turns) {
                turning.start();
            } else {
                turning.stop();
            }
        }
        state.showing().ifPresent(s -> {
            if (s.exposure() != toneStops || s.gamma() != toneGamma) {
                toneStops = s.exposure();
                toneGamma = s.gamma();
                canvas.toneChanged();
            }
        });
        readOut.placed();
    }

    /** True if two states differ in nothing but the place of the line. */
    private static boolean onlyTheDivider(DeskState before, DeskState now) {
        if (before.showing().isEmpty() || now.showing().isEmpty() || before.showing().equals(now.showing())) {
            return false;
        }
        return now.withShowing(now.showing().get().withDivider(before.showing().get().divider())).equals(before);
    }

    /** What can be done here. */
    public List<DeskAction> actions() {
        List<DeskAction> actions = new ArrayList<>(List.of(
                DeskAction.withShot("look.fit", "ctrl 0", canvas::fit),
                DeskAction.withShot("look.actual", "ctrl 1", canvas::actualSize),
                DeskAction.withShot("look.closer", "ctrl PERIOD", () -> zoom(STEP)),
                DeskAction.withShot("look.farther", "ctrl COMMA", () -> zoom(1 / STEP)),
                DeskAction.withShot("look.brighter", "ctrl UP", () -> brighten(0.5)),
                DeskAction.withShot("look.darker", "ctrl DOWN", () -> brighten(-0.5)),
                DeskAction.withShot("look.as-is", null, () -> desk.show(s -> s.withTone(0, 1))),
                DeskAction.withShot("look.outline", "ctrl L", () -> desk.show(s -> s.withOutline(!s.outline()))),
                DeskAction.withShot("look.view", "ctrl G", this::nextView),
                DeskAction.withShot("look.picture", "ctrl E", canvas::requestFocusInWindow)));
        for (Against each : Against.values()) {
            String word = each.name().toLowerCase(Locale.ROOT);
            actions.add(DeskAction.withShot("compare." + word, "shift " + (each.ordinal() + 1), () -> desk.show(s -> s.withAgainst(each))));
        }
        actions.add(DeskAction.withShot("compare.swap", "shift S", () -> desk.show(s -> s.withNear(s.far()).withFar(s.near()))));
        actions.add(divides("compare.divider-left", "ctrl alt LEFT", d -> new Divider(d.x() - DIVIDER_STEP, d.y(), d.radians())));
        actions.add(divides("compare.divider-right", "ctrl alt RIGHT", d -> new Divider(d.x() + DIVIDER_STEP, d.y(), d.radians())));
        actions.add(divides("compare.divider-turn", "ctrl alt UP", d -> new Divider(d.x(), d.y(), d.radians() + Math.PI / 12)));
        actions.addAll(strip.actions());
        return actions;
    }

    private DeskAction divides(String id, String key, UnaryOperator<Divider> change) {
        return DeskAction.of(id, key, s -> s.showing().map(w -> w.against() == Against.DIVIDER).orElse(false),
                () -> desk.show(s -> s.withDivider(change.apply(s.divider()))));
    }

    private void zoom(double factor) {
        canvas.zoom(factor, canvas.getWidth() / 2.0, canvas.getHeight() / 2.0);
    }

    private void brighten(double stops) {
        desk.show(s -> s.withTone(Math.max(-Showing.MOST_STOPS, Math.min(Showing.MOST_STOPS, s.exposure() + stops)), s.gamma()));
    }

    private void nextView() {
        List<ShotView> views = desk.state().shot().orElseThrow().setup().views();
        desk.show(s -> {
            int here = 0;
            for (int n = 0; n < views.size(); n++) {
                here = views.get(n).view().name().equals(s.view()) ? n : here;
            }
            return s.withView(views.get((here + 1) % views.size()).view().name());
        });
    }
}
