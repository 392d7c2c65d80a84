package org.wispwright.ui.window.ribbon;

import java.awt.Color;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.event.ActionEvent;
import java.awt.event.ComponentAdapter;
import java.awt.event.ComponentEvent;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import javax.swing.AbstractAction;
import javax.swing.KeyStroke;
import javax.swing.SwingUtilities;
import org.wispwright.render.view.Raster;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.OpenShot;
import org.wispwright.ui.desk.Pictures.Ask;
import org.wispwright.ui.desk.Places;
import org.wispwright.ui.desk.RangeScale;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.desk.Spans;
import org.wispwright.ui.desk.Thumbnails;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.window.DrawnPart;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** The frames along the range: dragging goes over them, a click on a pin goes to its note. */
final class RibbonStrip extends DrawnPart {
    private static final String ASKS = "ribbon";
    private static final int ROWS = 64;

    private final Desk desk;
    private final RibbonPainter painter = new RibbonPainter();
    private List<Ask> cells = List.of();
    private DeskState state = DeskState.EMPTY;

    RibbonStrip(Desk desk) {
        this.desk = desk;
        setName("strip");
        setFocusable(true);
        getAccessibleContext().setAccessibleName(Words.of("ribbon.strip"));
        setToolTipText(Words.of("ribbon.strip"));
        key("LEFT", () -> step(-1));
        key("RIGHT", () -> step(1));
        MouseAdapter pointer = new MouseAdapter() {
            private boolean dragging;

            @Override
            public void mousePressed(MouseEvent e) {
                requestFocusInWindow();
                Optional<Note> pin = pinAt(e.getX(), e.getY());
                dragging = SwingUtilities.isLeftMouseButton(e) && pin.isEmpty();
                pin.ifPresent(note -> desk.look(s -> Places.at(s, note.id())));
                go(e);
            }

            @Override
            public void mouseDragged(MouseEvent e) {
                go(e);
            }

            private void go(MouseEvent e) {
                if (dragging) {
                    scale().ifPresent(scale -> desk.show(s -> s.withFrame(scale.frameAt(e.getX()))));
                }
            }
        };
        addMouseListener(pointer);
        addMouseMotionListener(pointer);
        addFocusListener(new FocusAdapter() {
            @Override
            public void focusGained(FocusEvent e) {
                repaint();
            }

            @Override
            public void focusLost(FocusEvent e) {
                repaint();
            }
        });
        addComponentListener(new ComponentAdapter() {
            @Override
            public void componentResized(ComponentEvent e) {
                ask();
            }
        });
    }

    private void key(String key, Runnable run) {
        getInputMap(WHEN_FOCUSED).put(KeyStroke.getKeyStroke(key), key);
        getActionMap().put(key, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent e) {
                run.run();
            }
        });
    }

    private void step(int by) {
        state.showing().ifPresent(showing -> desk.look(s -> Places.onFrame(s, showing.frame() + by)));
    }

    /** Brings it up to the state. */
    void follow(DeskState now) {
        DeskState before = state;
        state = now;
        if (now.shot().isPresent()) {
            boolean same = before.shot().isPresent() && before.shot().get() == now.shot().get() && before.takes().equals(now.takes())
                    && before.showing().get().near().equals(now.showing().get().near())
                    && before.showing().get().view().equals(now.showing().get().view());
            if (!same) {
                ask();
            }
            getAccessibleContext().setAccessibleDescription(Words.of("ribbon.at", now.showing().orElseThrow().frame()));
        }
        repaint();
    }

    private Optional<RangeScale> scale() {
        return state.shot().filter(s -> getWidth() > 0).map(s -> new RangeScale(s.setup().flow().frames(), getWidth()));
    }

    private RibbonRows rows() {
        return RibbonRows.of(getFontMetrics(Palette.small()), getHeight());
    }

    /** As many small pictures as fit, and the figures of the take that is judged. */
    private void ask() {
        if (scale().isEmpty()) {
            return;
        }
        OpenShot shot = state.shot().orElseThrow();
        Showing showing = state.showing().orElseThrow();
        Source source = showing.near() instanceof Source.Take ? showing.near() : Source.ORIGINAL;
        Raster raster = shot.setup().view(showing.view()).orElseThrow().view().raster();
        double wide = Math.max(8, (double) rows().picture() * raster.width() / raster.height());
        int many = (int) Math.max(1, Math.min(shot.setup().flow().frames().count(), Math.floor(getWidth() / wide)));
        cells = new ArrayList<>();
        for (int n = 0; n < many; n++) {
            int frame = scale().orElseThrow().frameAt((n + 0.5) * getWidth() / many);
            cells.add(Thumbnails.ask(shot, source, showing.view(), frame, ROWS));
        }
        int number = ((Source.Take) source).number();
        boolean there = state.takes().stream().anyMatch(take -> take.number() == number && take.current());
        desk.thumbnails().want(ASKS, shot, there ? cells : List.of(), this::repaint);
        Places.judged(state).ifPresent(take -> {
            desk.met().want(ASKS, shot, take, this::repaint);
            desk.change().want(ASKS, shot, take, showing.view(), this::repaint);
        });
        repaint();
    }

    private Optional<Note> pinAt(int x, int y) {
        RibbonRows rows = rows();
        if (scale().isEmpty() || y < rows.pins() || y >= rows.pictures()) {
            return Optional.empty();
        }
        RangeScale scale = scale().orElseThrow();
        Note nearest = null;
        for (Listed listed : state.shot().orElseThrow().notes()) {
            double away = Math.abs(scale.middle(listed.note().frame()) - x);
            boolean nearer = nearest == null || away < Math.abs(scale.middle(nearest.frame()) - x);
            nearest = away <= RibbonRows.PIN && nearer ? listed.note() : nearest;
        }
        return Optional.ofNullable(nearest);
    }

    @Override
    public String getToolTipText(MouseEvent e) {
        if (scale().isEmpty()) {
            return null;
        }
        OpenShot shot = state.shot().orElseThrow();
        RibbonRows rows = rows();
        int frame = scale().orElseThrow().frameAt(e.getX());
        Optional<Note> pin = pinAt(e.getX(), e.getY());
        if (pin.isPresent()) {
            String on = shot.note(pin.get().id()).orElseThrow().on() ? "ribbon.pin" : "ribbon.pin.off";
            return Words.of(on, pin.get().frame(), pin.get().view(), pin.get().words());
        }
        if (e.getY() >= rows.holds() && e.getY() < rows.plot()) {
            return Spans.of(shot).stream().filter(span -> span.first() <= frame && span.last() >= frame).findFirst()
                    .map(span -> Words.of("ribbon.held", span.first(), span.last(), span.holds())).orElse(Words.of("ribbon.frame", frame));
        }
        OptionalInt take = Places.judged(state);
        Optional<Double> change = take.isEmpty() ? Optional.empty()
                : desk.change().of(shot, take.getAsInt(), state.showing().orElseThrow().view(), frame);
        return e.getY() >= rows.plot() && change.isPresent()
                ? Words.of("ribbon.change.tip", frame, String.format(Locale.ROOT, "%.1f", 100 * change.get()))
                : Words.of("ribbon.frame", frame);
    }

    @Override
    public Dimension getPreferredSize() {
        RibbonRows rows = RibbonRows.of(getFontMetrics(Palette.small()), 0);
        return new Dimension(300, rows.end());
    }

    @Override
    public Dimension getMinimumSize() {
        return new Dimension(100, getPreferredSize().height);
    }

    @Override
    protected void paintComponent(Graphics g) {
        Graphics2D g2 = (Graphics2D) g.create();
        scale().ifPresent(scale -> painter.paint(g2, desk, state, scale, rows(), cells));
        if (isFocusOwner()) {
            Color accent = Palette.ACCENT.colour();
            g2.setColor(accent);
            g2.drawRect(0, 0, getWidth() - 1, getHeight() - 1);
        }
        g2.dispose();
    }
}
