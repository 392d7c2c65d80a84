package org.wispwright.ui.window.easel;

import java.awt.geom.Point2D;
import java.util.Locale;
import javax.swing.JButton;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JSpinner;
import javax.swing.SpinnerNumberModel;
import net.miginfocom.swing.MigLayout;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.picture.Srgb;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.matte.Point;

/** Below the picture: the pixel under the pointer, the zoom, and the exposure and gamma to look with. */
final class ReadOut extends JPanel {
    private final Desk desk;
    private final EaselCanvas canvas;
    private final EaselPictures pictures;
    private final JLabel pixel = new JLabel(" ");
    private final JLabel zoom = new JLabel();
    private final JSpinner stops = new JSpinner(new SpinnerNumberModel(0, -Showing.MOST_STOPS, Showing.MOST_STOPS, 0.5));
    private final JSpinner gamma = new JSpinner(new SpinnerNumberModel(1, 0.2, 5, 0.1));
    private final JButton asIs = new JButton(Words.of("easel.as-is"));
    private boolean following;

    ReadOut(Desk desk, EaselCanvas canvas, EaselPictures pictures) {
        super(new MigLayout("insets 4 8 4 8, fillx, hidemode 3", "[grow][]8[]4[]8[]4[]4[]"));
        this.desk = desk;
        this.canvas = canvas;
        this.pictures = pictures;
        pixel.setName("read-out");
        pixel.setFont(Palette.small());
        pixel.setToolTipText(Words.of("easel.read.tip"));
        zoom.setName("zoom");
        zoom.setFont(Palette.small());
        add(pixel, "wmin 0, growx");
        add(zoom);
        add(label("easel.stops", stops));
        add(named(stops, "easel-stops"));
        add(label("easel.gamma", gamma));
        add(named(gamma, "easel-gamma"));
        asIs.setFont(Palette.small());
        add(named(asIs, "easel-as-is"));
        stops.addChangeListener(e -> tone());
        gamma.addChangeListener(e -> tone());
        asIs.addActionListener(e -> desk.show(s -> s.withTone(0, 1)));
        desk.listen(this::follow);
    }

    private static JLabel label(String key, JSpinner of) {
        JLabel label = new JLabel(Words.of(key));
        label.setFont(Palette.small());
        label.setLabelFor(of);
        return label;
    }

    private static <T extends javax.swing.JComponent> T named(T control, String name) {
        control.setName(name);
        String key = name.replaceFirst("-", ".");
        control.getAccessibleContext().setAccessibleName(Words.of(key));
        control.setToolTipText(Words.of(key + ".tip"));
        control.setFont(Palette.small());
        return control;
    }

    private void tone() {
        if (!following) {
            desk.show(s -> s.withTone((Double) stops.getValue(), ((Number) gamma.getValue()).doubleValue()));
        }
    }

    private void follow(DeskState state) {
        state.showing().ifPresent(showing -> {
            following = true;
            stops.setValue(showing.exposure());
            gamma.setValue(showing.gamma());
            asIs.setVisible(showing.exposure() != 0 || showing.gamma() != 1);
            following = false;
        });
    }

    /** The zoom changed. */
    void placed() {
        zoom.setText(Words.of("easel.zoom", Math.round(100 * canvas.zoomShare())));
    }

    /** The pointer is somewhere over the easel, in its pixels; null: it left. */
    void at(Point2D where) {
        Picture picture = pictures.nearPicture();
        if (where == null || picture == null) {
            pixel.setText(" ");
            return;
        }
        Point place = canvas.placement().toPicture(where.getX() + 0.5, where.getY() + 0.5);
        int x = (int) Math.floor(place.x() * picture.height());
        int y = (int) Math.floor(place.y() * picture.height());
        if (x < 0 || y < 0 || x >= picture.width() || y >= picture.height()) {
            pixel.setText(" ");
            return;
        }
        Rgb behind = desk.state().shot().orElseThrow().setup().background();
        double through = 1 - picture.at(x, y, 3);
        double r = picture.at(x, y, 0) + through * behind.r();
        double g = picture.at(x, y, 1) + through * behind.g();
        double b = picture.at(x, y, 2) + through * behind.b();
        pixel.setText(Words.of("easel.read", x, y, number(picture.at(x, y, 3)), number(r), number(g), number(b), Srgb.encodeTo(255, r),
                Srgb.encodeTo(255, g), Srgb.encodeTo(255, b)));
    }

    private static String number(double value) {
        return String.format(Locale.ROOT, "%.3f", value);
    }
}
