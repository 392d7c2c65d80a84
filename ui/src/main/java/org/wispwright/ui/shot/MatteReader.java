package org.wispwright.ui.shot;

import java.util.List;
import org.wispwright.warp.matte.BrushedMatte;
import org.wispwright.warp.matte.CombinedMatte;
import org.wispwright.warp.matte.DensityRange;
import org.wispwright.warp.matte.ImageMatte;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Pressure;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Sweep;

/** Reads mattes and positions (format: docs/shot-folder.md); positions are fractions of the picture's height. */
final class MatteReader {
    private static final double FARTHEST = 100;
    private static final List<String> FEATHERED = List.of("rectangle", "ellipse", "polygon", "density", "image");
    private static final String KINDS = "rectangle, ellipse, polygon, density, brushed, image, union, intersect, subtract or inverse";

    private MatteReader() {
    }

    /** A matte of any kind. @throws ShotException if it, or a picture it names, is not as it must be */
    static Matte matte(JsonPlace place) {
        place.only("rectangle", "ellipse", "polygon", "density", "brushed", "image", "union", "intersect", "subtract", "inverse",
                "feather");
        List<String> kinds = place.keys().stream().filter(key -> !key.equals("feather")).toList();
        if (kinds.size() != 1) {
            throw place.fault(kinds.size() + " kinds of matte in one", "one: " + KINDS, "give each matte one kind, and join them with "
                    + "union");
        }
        String kind = kinds.get(0);
        if (place.has("feather") && !FEATHERED.contains(kind)) {
            throw place.at("feather").fault("a feather beside '" + kind + "'", "one of " + String.join(", ", FEATHERED) + " beside it",
                    kind.equals("brushed") ? "give its brushes a softEdge" : "give one to the mattes inside");
        }
        boolean region = kind.equals("rectangle") || kind.equals("ellipse") || kind.equals("polygon");
        double feather = place.ask("feather").map(p -> p.number(0, Region.WIDEST_FEATHER)).orElse(region ? 0.02 : 0);
        JsonPlace what = place.need(kind);
        return switch (kind) {
            case "rectangle" -> rectangle(what, feather);
            case "ellipse" -> ellipse(what, feather);
            case "polygon" -> polygon(what, feather);
            case "density" -> density(what, feather);
            case "brushed" -> brushed(what);
            case "image" -> image(what, feather);
            case "union" -> combined(what, CombinedMatte.Way.UNION);
            case "intersect" -> combined(what, CombinedMatte.Way.INTERSECT);
            case "subtract" -> combined(what, CombinedMatte.Way.SUBTRACT);
            default -> {
                Matte part = matte(what);
                yield what.make(() -> new CombinedMatte(CombinedMatte.Way.INVERSE, List.of(part)));
            }
        };
    }

    private static Matte density(JsonPlace place, double feather) {
        place.only("from", "to", "soft");
        double from = place.ask("from").map(p -> p.number(0, 1)).orElse(0.0);
        double to = place.ask("to").map(p -> p.number(0, 1)).orElse(1.0);
        double soft = place.ask("soft").map(p -> p.number(DensityRange.LEAST_SOFT, 1)).orElse(0.1);
        return place.make(() -> new DensityRange(from, to, soft, feather));
    }

    private static Matte brushed(JsonPlace place) {
        List<BrushedMatte.Dab> dabs = place.items(1, BrushedMatte.MOST_DABS).stream().map(entry -> {
            entry.only("brush", "radius", "strength", "softEdge", "line", "pressure", "pressureOn", "spacing");
            return new BrushedMatte.Dab(entry.need("brush").choice(BrushedMatte.Way.class), sweep(entry));
        }).toList();
        return place.make(() -> new BrushedMatte(dabs));
    }

    private static Matte image(JsonPlace place, double feather) {
        place.only("file", "channel");
        ImageMatte.Channel channel = place.ask("channel").map(p -> p.choice(ImageMatte.Channel.class)).orElse(ImageMatte.Channel.GREY);
        return place.pictures().matte(place.need("file"), channel, feather);
    }

    private static Matte combined(JsonPlace place, CombinedMatte.Way way) {
        List<Matte> parts = place.items(2, CombinedMatte.MOST_PARTS).stream().map(MatteReader::matte).toList();
        return place.make(() -> new CombinedMatte(way, parts));
    }

    /** A brush's width, strength, edge, line, pressure and spacing; the keys beside them are the caller's. */
    static Sweep sweep(JsonPlace place) {
        double radius = place.need("radius").positive(1);
        double strength = place.ask("strength").map(p -> p.number(0, 1)).orElse(1.0);
        double softEdge = place.ask("softEdge").map(p -> p.number(0, 1)).orElse(0.5);
        List<Point> line = place.need("line").items(1, Sweep.MOST_POINTS).stream().map(MatteReader::point).toList();
        Pressure pressure = pressure(place, line.size());
        double spacing = place.ask("spacing").map(p -> p.number(0, Sweep.MOST_SPACING)).orElse(0.0);
        return place.make(() -> new Sweep(radius, strength, softEdge, line, pressure, spacing));
    }

    private static Pressure pressure(JsonPlace place, int points) {
        if (!place.has("pressure")) {
            if (place.has("pressureOn")) {
                throw place.fault("'pressureOn' without 'pressure'", "both or neither", "give 'pressure' a number for each point of "
                        + "'line'");
            }
            return Pressure.FULL;
        }
        List<Double> values = place.need("pressure").items(1, Sweep.MOST_POINTS).stream().map(p -> p.number(0, 1)).toList();
        if (values.size() != points) {
            throw place.need("pressure").fault(values.size() + " numbers for " + points + " points", "one for each point of 'line'",
                    "add or remove some");
        }
        Pressure.On on = place.ask("pressureOn").map(p -> p.choice(Pressure.On.class)).orElse(Pressure.FULL.on());
        return place.make(() -> new Pressure(on, values));
    }

    /** Left, top, right, bottom. */
    static double[] sides(JsonPlace place) {
        place.only("left", "top", "right", "bottom");
        return new double[] {coordinate(place.need("left")), coordinate(place.need("top")), coordinate(place.need("right")),
            coordinate(place.need("bottom"))};
    }

    private static Region rectangle(JsonPlace place, double feather) {
        double[] sides = sides(place);
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
