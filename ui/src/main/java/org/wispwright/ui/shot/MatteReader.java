package org.wispwright.ui.shot;

import java.util.List;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;

/** Reads mattes and positions (format: docs/shot-folder.md); positions are fractions of the picture's height. */
final class MatteReader {
    private static final double FARTHEST = 100;

    private MatteReader() {
    }

    /** A region, or another kind of matte. @throws ShotException if it is not as it must be */
    static Matte matte(JsonPlace place) {
        place.only("rectangle", "ellipse", "polygon", "feather");
        double feather = place.ask("feather").map(p -> p.number(0, Region.WIDEST_FEATHER)).orElse(0.02);
        List<String> kinds = place.keys().stream().filter(key -> !key.equals("feather")).toList();
        if (kinds.size() != 1) {
            throw place.fault(kinds.size() + " outlines", "one: rectangle, ellipse or polygon", "give each region one outline");
        }
        JsonPlace outline = place.need(kinds.get(0));
        return switch (kinds.get(0)) {
            case "rectangle" -> rectangle(outline, feather);
            case "ellipse" -> ellipse(outline, feather);
            default -> polygon(outline, feather);
        };
    }

    private static Region rectangle(JsonPlace place, double feather) {
        place.only("left", "top", "right", "bottom");
        double[] sides = {coordinate(place.need("left")), coordinate(place.need("top")), coordinate(place.need("right")),
                coordinate(place.need("bottom"))};
        return place.make(() -> new Region.Rectangle(sides[0], sides[1], sides[2], sides[3], feather));
    }

    private static Region ellipse(JsonPlace place, double feather) {
        place.only("centre", "radii");
        Point centre = point(place.need("centre"));
        List<JsonPlace> radii = place.need("radii").items(2, 2);
        double across = radii.get(0).positive(FARTHEST);
        double down = radii.get(1).positive(FARTHEST);
        return place.make(() -> new Region.Ellipse(centre, across, down, feather));
    }

    private static Region polygon(JsonPlace place, double feather) {
        List<Point> corners = place.items(3, Region.Polygon.MOST_POINTS).stream().map(MatteReader::point).toList();
        return place.make(() -> new Region.Polygon(corners, feather));
    }

    /** A position: two numbers. */
    static Point point(JsonPlace place) {
        List<JsonPlace> xy = place.items(2, 2);
        return new Point(coordinate(xy.get(0)), coordinate(xy.get(1)));
    }

    private static double coordinate(JsonPlace place) {
        return place.number(-FARTHEST, FARTHEST);
    }
}
