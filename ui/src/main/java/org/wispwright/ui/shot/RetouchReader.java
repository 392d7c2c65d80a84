package org.wispwright.ui.shot;

import java.util.List;
import java.util.Optional;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.Stroke;

/** Reads the operations of a retouch (format: docs/shot-folder.md). */
final class RetouchReader {
    private RetouchReader() {
    }

    /** One entry of a note's list. @throws ShotException if it is not as it must be */
    static Operation operation(JsonPlace place) {
        place.only("stroke", "meshWarp");
        if (place.keys().size() != 1) {
            throw place.fault(place.keys().size() + " operations in one entry", "one: stroke or meshWarp", "give each an entry of its own");
        }
        return place.has("stroke") ? stroke(place.need("stroke")) : meshWarp(place.need("meshWarp"));
    }

    private static Operation stroke(JsonPlace place) {
        place.only("brush", "radius", "strength", "softEdge", "line", "within");
        Brush brush = place.need("brush").choice(Brush.class);
        Sweep sweep = MatteReader.sweep(place);
        Optional<Matte> within = place.ask("within").map(MatteReader::matte);
        return place.make(() -> new Stroke(brush, sweep, within));
    }

    private static Operation meshWarp(JsonPlace place) {
        place.only("handles", "within");
        List<Handle> handles = place.need("handles").items(3, MeshWarp.MOST_HANDLES).stream().map(RetouchReader::handle).toList();
        Optional<Matte> within = place.ask("within").map(MatteReader::matte);
        return place.make(() -> new MeshWarp(handles, within));
    }

    private static Handle handle(JsonPlace place) {
        place.only("from", "to", "pin");
        if (!place.has("pin")) {
            return new Handle(MatteReader.point(place.need("from")), MatteReader.point(place.need("to")));
        }
        if (place.has("from") || place.has("to")) {
            throw place.fault("a pin that is also pulled", "either 'pin', or 'from' and 'to'", "remove one of them");
        }
        return Handle.pin(MatteReader.point(place.need("pin")));
    }
}
