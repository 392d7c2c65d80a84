package org.wispwright.ui.window.easel;

import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.event.ActionEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.awt.geom.Line2D;
import java.awt.geom.Point2D;
import java.util.function.BooleanSupplier;
import java.util.function.Supplier;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.KeyStroke;
import org.wispwright.warp.matte.Point;

/**
 * * A pointer for the keyboard, so that every hand can be used without a mouse. While the picture has the focus and a hand is taken up,
 * arrow keys move a cross by a hundredth of the picture's height, with Shift by a tenth; Space presses the button and lets it go, with
 * Ctrl it clicks with Ctrl; Enter lets go; Escape drops what was begun; Delete removes what is chosen. The mouse takes over when it moves.
 */
final class KeyPointer {
    private static final double STEP = 0.01;
    private static final double LEAP = 0.1;
    private static final double ARM = 9;
    private static final int ROOM = 14;

    private final JComponent canvas;
    private final Surface surface;
    private final Supplier<Tool> tool;
    private final BooleanSupplier inHand;
    private Point place;
    private boolean down;

    /**
     * Binds the keys.
     *
     * @param canvas  that has the focus
     * @param surface where the picture lies
     * @param tool    the tool of the moment
     * @param inHand  whether there is one that does anything; without it the keys are left to others
     * @param remove  removes what is chosen
     */
    KeyPointer(JComponent canvas, Surface surface, Supplier<Tool> tool, BooleanSupplier inHand, Runnable remove) {
        this.canvas = canvas;
        this.surface = surface;
        this.tool = tool;
        this.inHand = inHand;
        for (String shift : new String[] {"", "shift "}) {
            double step = shift.isEmpty() ? STEP : LEAP;
            bind(shift + "LEFT", () -> move(-step, 0));
            bind(shift + "RIGHT", () -> move(step, 0));
            bind(shift + "UP", () -> move(0, -step));
            bind(shift + "DOWN", () -> move(0, step));
        }
        bind("SPACE", this::turn);
        bind("ctrl SPACE", this::clickWithCtrl);
        bind("ENTER", this::letGo);
        bind("ESCAPE", this::drop);
        bind("DELETE", remove);
        canvas.addMouseMotionListener(new MouseAdapter() {
            @Override
            public void mouseMoved(MouseEvent e) {
                hide();
            }
        });
        canvas.addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent e) {
                hide();
            }
        });
    }

    private void bind(String key, Runnable run) {
        canvas.getInputMap(JComponent.WHEN_FOCUSED).put(KeyStroke.getKeyStroke(key), "pointer " + key);
        canvas.getActionMap().put("pointer " + key, new AbstractAction() {
            @Override
            public boolean isEnabled() {
                return inHand.getAsBoolean();
            }

            @Override
            public void actionPerformed(ActionEvent e) {
                run.run();
            }
        });
    }

    private void move(double dx, double dy) {
        Placement placement = surface.placement();
        appear();
        Point2D to = placement.toScreen(new Point(place.x() + dx, place.y() + dy));
        place = placement.toPicture(Math.max(0, Math.min(canvas.getWidth() - 1, to.getX())),
                Math.max(0, Math.min(canvas.getHeight() - 1, to.getY())));
        if (down) {
            tool.get().dragged(pointer(false));
        } else {
            tool.get().moved(pointer(false));
        }
        surface.overlayChanged();
    }

    private void appear() {
        if (place == null) {
            place = surface.placement().toPicture(canvas.getWidth() / 2.0, canvas.getHeight() / 2.0);
        }
    }

    private void turn() {
        if (down) {
            letGo();
        } else {
            appear();
            down = true;
            tool.get().pressed(pointer(false));
            surface.overlayChanged();
        }
    }

    private void clickWithCtrl() {
        letGo();
        appear();
        tool.get().pressed(pointer(true));
        tool.get().released(pointer(true));
        surface.overlayChanged();
    }

    private void letGo() {
        if (down) {
            down = false;
            tool.get().released(pointer(false));
            surface.overlayChanged();
        }
    }

    private void drop() {
        down = false;
        tool.get().cancel();
        surface.overlayChanged();
    }

    private void hide() {
        letGo();
        if (place != null) {
            place = null;
            surface.overlayChanged();
        }
    }

    private Pointer pointer(boolean ctrl) {
        Placement placement = surface.placement();
        Point2D at = placement.toScreen(place);
        return new Pointer(place, at.getX(), at.getY(), 1, false, ctrl, false, 1 / placement.scale());
    }

    /** Draws the cross, while keys move it; thicker while the button is down. */
    void paint(Graphics2D g, Placement placement) {
        if (place != null) {
            Point2D at = placement.toScreen(place);
            float width = down ? 3 : 1.5f;
            for (int side = -1; side <= 1; side += 2) {
                double near = side * (ROOM - ARM);
                double far = side * ROOM;
                Marks.line(g, new Line2D.Double(at.getX() + near, at.getY(), at.getX() + far, at.getY()), Color.WHITE, width);
                Marks.line(g, new Line2D.Double(at.getX(), at.getY() + near, at.getX(), at.getY() + far), Color.WHITE, width);
            }
        }
    }
}
