package org.wispwright.warp.matte;

import java.util.List;

/** The checks that the value records of this room share. Each throws {@link IllegalArgumentException} with one sentence. */
public final class Needs {
    private Needs() {
    }

    public static void present(String owner, String name, Object value) {
        if (value == null) {
            throw new IllegalArgumentException(owner + ": '" + name + "' is missing");
        }
    }

    public static void share(String owner, String name, double value) {
        if (!(value >= 0 && value <= 1)) {
            throw new IllegalArgumentException(owner + ": got " + name + " " + value + ", needs 0 to 1");
        }
    }

    public static void feather(String owner, double feather) {
        if (!(feather >= 0 && feather <= Region.WIDEST_FEATHER)) {
            throw new IllegalArgumentException(owner + ": got feather " + feather + ", needs a fraction of the picture's height, 0 to "
                    + Region.WIDEST_FEATHER);
        }
    }

    public static List<Point> points(String owner, String name, List<Point> points, int fewest, int most) {
        if (points.size() < fewest || points.size() > most) {
            throw new IllegalArgumentException(owner + ": '" + name + "' has " + points.size() + " points, needs " + fewest + " to "
                    + most);
        }
        for (int n = 0; n < points.size(); n++) {
            present(owner, name + " point " + n, points.get(n));
        }
        return List.copyOf(points);
    }
}
