package org.wispwright.ui.window.easel;

import java.awt.Cursor;
import java.awt.event.InputEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.awt.event.MouseWheelEvent;
import java.awt.geom.Point2D;
import java.util.function.Consumer;
import javax.swing.JPopupMenu;
import javax.swing.SwingUtilities;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.Showing.Divider;
import org.wispwright.ui.window.easel.DividerLine.Part;

/** The pointer over the easel: the wheel zooms, the middle button pans, the divider is pulled, all else goes to the tool. */
final class EaselPointing extends MouseAdapter {
    private static final double NOTCH = 1.15;

    private final Desk desk;
    private final EaselCanvas canvas;
    private final Consumer<Point2D> read;
    private final java.util.function.Supplier<JPopupMenu> menu;
    private Part pulled = Part.NONE;
    private Divider before;
    private Point2D grabbed;
    private Point2D panned;
    private boolean drawing;

    /** @param read told where the pointer is, in the easel's pixels; null when it left @param menu of the right button */
    EaselPointing(Desk desk, EaselCanvas canvas, Consumer<Point2D> read, java.util.function.Supplier<JPopupMenu> menu) {
        this.desk = desk;
        this.canvas = canvas;
        this.read = read;
        this.menu = menu;
        canvas.addMouseListener(this);
        canvas.addMouseMotionListener(this);
        canvas.addMouseWheelListener(this);
    }

    @Override
    public void mousePressed(MouseEvent e) {
        canvas.requestFocusInWindow();
        if (e.isPopupTrigger()) {
            menu.get().show(canvas, e.getX(), e.getY());
            return;
        }
        DividerLine line = canvas.divider();
        Part part = line == null ? Part.NONE : line.at(e.getX(), e.getY());
        if (SwingUtilities.isMiddleMouseButton(e) || SwingUtilities.isLeftMouseButton(e) && part == Part.NONE
                && desk.state().hand() instanceof Hand.Looking) {
            panned = e.getPoint();
            canvas.setCursor(Cursor.getPredefinedCursor(Cursor.MOVE_CURSOR));
        } else if (SwingUtilities.isLeftMouseButton(e) && part != Part.NONE) {
            pulled = part;
            before = desk.state().showing().orElseThrow().divider();
            grabbed = e.getPoint();
        } else if (SwingUtilities.isLeftMouseButton(e)) {
            drawing = true;
            canvas.tool().pressed(pointer(e));
        }
    }

    @Override
    public void mouseDragged(MouseEvent e) {
        read.accept(e.getPoint());
        if (panned != null) {
            canvas.pan(e.getX() - panned.getX(), e.getY() - panned.getY());
            panned = e.getPoint();
        } else if (pulled != Part.NONE) {
            DividerLine start = new DividerLine(before, canvas.placement(), canvas.aspect());
            Divider to = start.pulled(pulled, e.getX(), e.getY(), canvas.placement(), canvas.aspect(), grabbed);
            desk.show(s -> s.withDivider(to));
        } else if (drawing) {
            canvas.tool().dragged(pointer(e));
        }
    }

    @Override
    public void mouseReleased(MouseEvent e) {
        if (e.isPopupTrigger()) {
            menu.get().show(canvas, e.getX(), e.getY());
        } else if (drawing) {
            canvas.tool().released(pointer(e));
        }
        panned = null;
        pulled = Part.NONE;
        drawing = false;
        canvas.setCursor(canvas.tool().cursor());
    }

    @Override
    public void mouseMoved(MouseEvent e) {
        read.accept(e.getPoint());
        DividerLine line = canvas.divider();
        Part part = line == null ? Part.NONE : line.at(e.getX(), e.getY());
        canvas.setCursor(part == Part.NONE ? canvas.tool().cursor() : Cursor.getPredefinedCursor(part == Part.KNOB ? Cursor.MOVE_CURSOR
                : Cursor.CROSSHAIR_CURSOR));
        canvas.tool().moved(pointer(e));
    }

    @Override
    public void mouseExited(MouseEvent e) {
        read.accept(null);
        canvas.tool().exited();
    }

    @Override
    public void mouseWheelMoved(MouseWheelEvent e) {
        canvas.zoom(Math.pow(NOTCH, -e.getPreciseWheelRotation()), e.getX(), e.getY());
    }

    private Pointer pointer(MouseEvent e) {
        Placement p = canvas.placement();
        int menuKey = java.awt.Toolkit.getDefaultToolkit().getMenuShortcutKeyMaskEx();
        return new Pointer(p.toPicture(e.getX() + 0.5, e.getY() + 0.5), e.getX() + 0.5, e.getY() + 0.5, 1, e.isShiftDown(),
                (e.getModifiersEx() & (InputEvent.CTRL_DOWN_MASK | menuKey)) != 0, e.isAltDown(), 1 / p.scale());
    }
}
