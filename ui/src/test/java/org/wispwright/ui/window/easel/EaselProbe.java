package org.wispwright.ui.window.easel;

import java.awt.Component;
import java.awt.Point;
import java.awt.geom.Point2D;
import org.wispwright.ui.window.DeskDriver;

/** What only the easel's own room can tell a test. */
public final class EaselProbe {
    private EaselProbe() {
    }

    /** Where a place of the picture, in heights, lies on the screen. */
    public static Point onScreen(Component picture, org.wispwright.warp.matte.Point place) {
        return DeskDriver.onSwing(() -> {
            Point2D at = ((EaselCanvas) picture).placement().toScreen(place);
            Point corner = picture.getLocationOnScreen();
            return new Point(corner.x + (int) Math.round(at.getX()), corner.y + (int) Math.round(at.getY()));
        });
    }

    /** True if the hand works on a picture of its own, and it is at rest. */
    public static boolean hasLive(Component picture) {
        return ((EaselCanvas) picture).tool() instanceof RetouchTool tool && tool.retouching.isAtRest();
    }
}
