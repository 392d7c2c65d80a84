package org.wispwright.ui.shot;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.render.view.Vec3;

/** Reads what moves: a value that stays, or {@code keys} over frames. */
final class MotionReader {
    private MotionReader() {
    }

    /** Refuses an object that has none or both of a staying value and keys. */
    static void requireOne(JsonPlace place, String still) {
        if (place.has(still) == place.has("keys")) {
            throw place.fault(place.has(still) ? "both '" + still + "' and 'keys'" : "neither '" + still + "' nor 'keys'",
                    "one of the two", place.has(still) ? "remove one of them" : "add one of them");
        }
    }

    /** One curve of a list of keys; {@code value} reads a key's own. */
    static Curve curve(JsonPlace keys, Function<JsonPlace, Vec3> value) {
        List<Double> frames = new ArrayList<>();
        List<Vec3> values = new ArrayList<>();
        for (JsonPlace key : keys.items(1, Curve.MOST_KEYS)) {
            double frame = key.need("frame").number(-1e6, 1e9);
            if (!frames.isEmpty() && !(frame > frames.get(frames.size() - 1))) {
                throw key.at("frame").fault("frame " + frame + " after frame " + frames.get(frames.size() - 1),
                        "frames that rise from key to key",
                        "sort the keys");
            }
            frames.add(frame);
            values.add(value.apply(key));
        }
        return keys.make(() -> new Curve(frames, values));
    }
}
