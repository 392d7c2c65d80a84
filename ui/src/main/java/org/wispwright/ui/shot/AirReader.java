package org.wispwright.ui.shot;

import java.util.Optional;
import org.wispwright.optimize.flow.Start;
import org.wispwright.optimize.flow.Wind;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/** Reads what the air does by itself: {@code flow.wind}, and {@code start}, what is in the box on the first frame. */
final class AirReader {
    private static final double FASTEST = 1e4;
    private static final String WIND = "metresPerSecond";
    private static final String PUSH = "metresPerSecond2";

    private AirReader() {
    }

    static Wind wind(JsonPlace place) {
        place.only(WIND, PUSH, "dragPerSecond", "keys");
        double drag = place.ask("dragPerSecond").map(p -> p.number(0, 1000)).orElse(0.0);
        Curve velocity;
        Curve acceleration;
        boolean blows;
        if (place.has("keys")) {
            if (place.has(WIND) || place.has(PUSH)) {
                throw place.at("keys").fault("keys beside a value that stays", "one of the two", "remove one of them");
            }
            JsonPlace keys = place.need("keys");
            keys.items(1, Curve.MOST_KEYS).forEach(key -> key.only("frame", WIND, PUSH));
            velocity = MotionReader.curve(keys, key -> vector(key, WIND));
            acceleration = MotionReader.curve(keys, key -> vector(key, PUSH));
            blows = keys.items(1, Curve.MOST_KEYS).stream().anyMatch(key -> key.has(WIND));
        } else {
            velocity = Curve.still(vector(place, WIND));
            acceleration = Curve.still(vector(place, PUSH));
            blows = place.has(WIND);
        }
        if (blows && drag == 0) {
            throw place.fault("a wind without a drag, which moves nothing", "'dragPerSecond' above 0", "add it, for example 2");
        }
        return place.make(() -> new Wind(acceleration, velocity, drag));
    }

    private static Vec3 vector(JsonPlace place, String key) {
        return place.ask(key).map(p -> {
            double[] v = p.numbers(3, -FASTEST, FASTEST);
            return new Vec3(v[0], v[1], v[2]);
        }).orElse(new Vec3(0, 0, 0));
    }

    /** Volumes of the shot's own grid. */
    static Start start(Optional<JsonPlace> given, Optional<GridShape> grid, VolumeReader volumes) {
        if (given.isEmpty()) {
            return Start.EMPTY;
        }
        JsonPlace place = given.get();
        place.only("density", "temperature", "velocityX", "velocityY", "velocityZ");
        boolean moves = place.has("velocityX") || place.has("velocityY") || place.has("velocityZ");
        if (moves) {
            place.need("velocityX");
            place.need("velocityY");
            place.need("velocityZ");
        }
        if (grid.isEmpty()) {
            return Start.EMPTY;
        }
        GridShape g = grid.get();
        Optional<ScalarGrid> density = place.ask("density").map(p -> new ScalarGrid(g, fromZero(p, volumes.read(p, g.nz(), g.ny(),
                g.nx()))));
        Optional<ScalarGrid> temperature = place.ask("temperature")
                .map(p -> new ScalarGrid(g, volumes.read(p, g.nz(), g.ny(), g.nx())));
        Optional<MacVelocity> velocity = Optional.empty();
        if (moves) {
            velocity = Optional.of(new MacVelocity(g, volumes.read(place.need("velocityX"), g.nz(), g.ny(), g.nx() + 1),
                    volumes.read(place.need("velocityY"), g.nz(), g.ny() + 1, g.nx()),
                    volumes.read(place.need("velocityZ"), g.nz() + 1, g.ny(), g.nx())));
        }
        return new Start(density, temperature, velocity);
    }

    private static float[] fromZero(JsonPlace place, float[] density) {
        for (float value : density) {
            if (value < 0) {
                throw place.fault("a density of " + value, "values from 0", "find what made it");
            }
        }
        return density;
    }
}
