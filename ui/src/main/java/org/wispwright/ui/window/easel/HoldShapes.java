package org.wispwright.ui.window.easel;

import java.awt.Shape;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.measure.Plane;
import org.wispwright.warp.outline.Loop;
import org.wispwright.warp.outline.OutlineTracer;

/** Outlines of mattes as shapes in heights. */
final class HoldShapes {
    private static final double HALF = 0.5;

    private HoldShapes() {
    }

    /**
     * A region as it was drawn; any other matte where its value is 1/2.
     *
     * @param original what such a matte depends on; without it, it has no outline
     */
    static Shape of(Matte matte, Optional<Picture> original) {
        if (matte instanceof Region.Rectangle r) {
            return new Rectangle2D.Double(r.left(), r.top(), r.right() - r.left(), r.bottom() - r.top());
        }
        if (matte instanceof Region.Ellipse e) {
            return new Ellipse2D.Double(e.centre().x() - e.radiusX(), e.centre().y() - e.radiusY(), 2 * e.radiusX(), 2 * e.radiusY());
        }
        Path2D path = new Path2D.Double(Path2D.WIND_EVEN_ODD);
        if (matte instanceof Region.Polygon polygon) {
            Point first = polygon.outline().get(0);
            path.moveTo(first.x(), first.y());
            polygon.outline().forEach(p -> path.lineTo(p.x(), p.y()));
            path.closePath();
        } else {
            original.ifPresent(picture -> {
                for (Loop loop : OutlineTracer.trace(Plane.of(picture.width(), picture.height(), matte.values(picture)), HALF)) {
                    path.moveTo(loop.x()[0], loop.y()[0]);
                    for (int n = 1; n < loop.size(); n++) {
                        path.lineTo(loop.x()[n], loop.y()[n]);
                    }
                    path.closePath();
                }
            });
        }
        return path;
    }
}
