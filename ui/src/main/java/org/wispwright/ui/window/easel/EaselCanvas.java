package org.wispwright.ui.window.easel;

import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.Rectangle;
import java.awt.RenderingHints;
import java.awt.Shape;
import java.awt.BasicStroke;
import java.awt.geom.AffineTransform;
import java.awt.event.ComponentAdapter;
import java.awt.event.ComponentEvent;
import javax.swing.JPanel;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.desk.Against;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.matte.Window;

/**
 * The picture, where it lies, and what the hand draws over it. Zoom and pan are its own and stay whatever is shown. A small change draws the
 * few pixels it touches: pictures are kept in the screen's own pixels ({@link Pane}).
 */
final class EaselCanvas extends JPanel implements Surface {
    private final Desk desk;
    private final EaselPictures pictures;
    private final Pane nearPane = new Pane();
    private final Pane farPane = new Pane();
    /** As if one picture were shown alone; {@link #placement()} is where the first lies. */
    private Placement placement;
    private boolean fitted = true;
    private boolean turn;
    private Plate live;
    private Tool tool = new LookTool();
    private KeyPointer keys;
    private double screenScale = 1;
    private Runnable placed = () -> { };

    EaselCanvas(Desk desk, EaselPictures pictures) {
        this.desk = desk;
        this.pictures = pictures;
        setName("easel-picture");
        setFocusable(true);
        setOpaque(true);
        getAccessibleContext().setAccessibleName(Words.of("easel.picture"));
        getAccessibleContext().setAccessibleDescription(Words.of("easel.picture.tip"));
        addComponentListener(new ComponentAdapter() {
            @Override
            public void componentResized(ComponentEvent e) {
                if (fitted) {
                    fit();
                }
            }
        });
        addFocusListener(new java.awt.event.FocusListener() {
            @Override
            public void focusGained(java.awt.event.FocusEvent e) {
                repaint();
            }

            @Override
            public void focusLost(java.awt.event.FocusEvent e) {
                repaint();
            }
        });
    }

    /** Told whenever zoom or pan changed. */
    void whenPlaced(Runnable told) {
        placed = told;
    }

    /** Takes up a tool. */
    void use(Tool other) {
        tool.leave();
        tool = other;
        setCursor(other.cursor());
        repaint();
    }

    /** The keyboard's own pointer, drawn over the tool. */
    void use(KeyPointer pointer) {
        keys = pointer;
    }

    /** True if the picture, be it a draft, is of the frame that is wished for. */
    boolean isOfFrameShown() {
        return pictures.isOfFrameShown();
    }

    Tool tool() {
        return tool;
    }

    /** Width over height of the view shown; 1 before there is one. */
    double aspect() {
        return desk.state().shot().flatMap(s -> desk.state().showing().flatMap(w -> s.setup().view(w.view())))
                .map(v -> (double) v.view().raster().width() / v.view().raster().height()).orElse(1.0);
    }

    /** Rows of the view shown. */
    int rows() {
        return desk.state().shot().flatMap(s -> desk.state().showing().flatMap(w -> s.setup().view(w.view())))
                .map(v -> v.view().raster().height()).orElse(1);
    }

    /** Lays the whole picture in the middle. */
    void fit() {
        if (getWidth() <= 0 || getHeight() <= 0) {
            return;
        }
        double margin = 4 * Palette.STEP;
        double scale = Math.max(16, Math.min((getWidth() - margin) / aspect(), getHeight() - margin));
        place(new Placement((getWidth() - scale * aspect()) / 2, (getHeight() - scale) / 2, scale));
        fitted = true;
    }

    /** One pixel of the picture for each of the screen's, about the middle. */
    void actualSize() {
        zoom(rows() / screenScale / placement().scale(), getWidth() / 2.0, getHeight() / 2.0);
    }

    /** Zooms with a place kept. */
    void zoom(double factor, double x, double y) {
        double scale = Math.max(16, Math.min(64.0 * rows(), placement().scale() * factor));
        place(placement().zoomed(scale / placement().scale(), x, y).moved(besideShift(), 0));
    }

    void pan(double dx, double dy) {
        place(placement().moved(dx + besideShift(), dy));
    }

    /** Side by side, each half shows what was in the middle of the whole, at the same zoom. */
    private double besideShift() {
        return isBeside() ? getWidth() / 4.0 : 0;
    }

    private void place(Placement other) {
        placement = other;
        fitted = false;
        placed.run();
        repaint();
    }

    /** Share of the picture's own size at which it is shown. */
    double zoomShare() {
        return placement().scale() * screenScale / rows();
    }

    /** Shows the other of two pictures that are shown in turn. */
    void turn() {
        turn = !turn;
        repaint();
    }

    @Override
    public Placement placement() {
        if (placement == null) {
            fit();
        }
        return placement == null ? new Placement(0, 0, 100) : placement.moved(-besideShift(), 0);
    }

    @Override
    public void showLive(Picture picture) {
        if (picture == null) {
            live = null;
        } else if (live == null || live.picture() != picture) {
            live = new Plate(picture, pictures.tone());
        }
        repaint();
    }

    @Override
    public void changed(Window pixels) {
        if (live != null) {
            live.refresh(pixels);
            Rectangle part = nearPane.changed(pixels);
            if (!part.isEmpty()) {
                repaint((int) Math.floor(part.x / screenScale) - 1, (int) Math.floor(part.y / screenScale) - 1,
                        (int) Math.ceil(part.width / screenScale) + 3, (int) Math.ceil(part.height / screenScale) + 3);
            }
        }
    }

    @Override
    public void overlayChanged(int x, int y, int width, int height) {
        repaint(x, y, width, height);
    }

    @Override
    public void overlayChanged() {
        repaint();
    }

    /** The tone changed: a live picture is coded anew. */
    void toneChanged() {
        if (live != null) {
            live = new Plate(live.picture(), pictures.tone());
        }
        repaint();
    }

    /** The dividing line; null if there is none. */
    DividerLine divider() {
        Showing showing = desk.state().showing().orElse(null);
        return showing == null || showing.against() != Against.DIVIDER ? null : new DividerLine(showing.divider(), placement(), aspect());
    }

    /** The line was somewhere else: draws what lies between, and no more. */
    void dividerMoved(Showing.Divider from) {
        Rectangle band = new DividerLine(from, placement(), aspect()).reach(getWidth(), getHeight());
        DividerLine now = divider();
        if (now != null) {
            band = band.union(now.reach(getWidth(), getHeight()));
        }
        repaint(band);
    }

    private boolean isBeside() {
        return desk.state().showing().map(s -> s.against() == Against.BESIDE).orElse(false);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        Graphics2D g = (Graphics2D) graphics.create();
        try {
            screenScale = g.getTransform().getScaleX();
            AffineTransform toScreen = AffineTransform.getScaleInstance(1 / screenScale, 1 / screenScale);
            paintPictures(g, toScreen);
            g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
            g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
            if (live == null) {
                Overlays.outline(g, pictures.outline(), placement());
            }
            tool.paint(g, placement());
            if (keys != null) {
                keys.paint(g, placement());
            }
            DividerLine line = divider();
            if (line != null) {
                Overlays.divider(g, line);
            } else if (isBeside()) {
                Overlays.halves(g, getWidth(), getHeight());
            }
            if (isFocusOwner()) {
                g.setColor(Palette.ACCENT.colour());
                g.setStroke(new BasicStroke(2));
                g.draw(new Rectangle(1, 1, getWidth() - 2, getHeight() - 2));
            }
        } finally {
            g.dispose();
        }
    }

    private void paintPictures(Graphics2D g, AffineTransform toScreen) {
        int width = (int) Math.ceil(getWidth() * screenScale);
        int height = (int) Math.ceil(getHeight() * screenScale);
        int surround = Palette.SURROUND.colour().getRGB() & 0xffffff;
        Placement lies = scaled(placement());
        Against against = desk.state().showing().map(Showing::against).orElse(Against.ALONE);
        Plate first = live != null ? live : pictures.near();
        boolean second = pictures.far() != null && (against == Against.DIVIDER || against == Against.BESIDE || against == Against.BLINK);
        if (against == Against.BLINK && turn && second) {
            farPane.show(pictures.far(), lies, width, height, surround);
            farPane.paint(g, toScreen);
            return;
        }
        nearPane.show(first, lies, width, height, surround);
        nearPane.paint(g, toScreen);
        if (second && against != Against.BLINK) {
            Shape clip = g.getClip();
            if (against == Against.BESIDE) {
                int half = getWidth() / 2;
                lies = scaled(placement().moved(getWidth() / 2.0, 0));
                g.clipRect(half, 0, getWidth() - half, getHeight());
            } else {
                g.clip(divider().farSide());
            }
            farPane.show(pictures.far(), lies, width, height, surround);
            farPane.paint(g, toScreen);
            g.setClip(clip);
        }
    }

    private Placement scaled(Placement p) {
        return new Placement(p.left() * screenScale, p.top() * screenScale, p.scale() * screenScale);
    }
}
