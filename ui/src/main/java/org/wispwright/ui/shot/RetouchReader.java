package org.wispwright.ui.shot;

import java.util.List;
import java.util.Optional;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Cells;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.HandleGrid;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.Stroke;
import org.wispwright.warp.retouch.WarpKind;

/** Reads the operations of a retouch (format: docs/shot-folder.md); the layers of a paint-over are read by {@link PaintFile}. */
final class RetouchReader {
    private RetouchReader() {
    }

    /** One entry of a note's list. @throws ShotException if it is not as it must be */
    static Operation operation(JsonPlace place, ShotFolder folder) {
        place.only("stroke", "meshWarp", "outline", "paintOver");
        if (place.keys().size() != 1) {
            throw place.fault(place.keys().size() + " operations in one entry", "one: stroke, meshWarp, outline or paintOver",
                    "give each an entry of its own");
        }
        if (place.has("paintOver")) {
            JsonPlace paintOver = place.need("paintOver").only("layers");
            return PaintFile.read(folder, paintOver.need("layers"));
        }
        return place.has("stroke") ? stroke(place.need("stroke")) : place.has("outline") ? outline(place.need("outline"))
                : meshWarp(place.need("meshWarp"));
    }

    private static Operation stroke(JsonPlace place) {
        place.only("brush", "radius", "strength", "softEdge", "line", "pressure", "pressureOn", "spacing", "within");
        Brush brush = place.need("brush").choice(Brush.class);
        Sweep sweep = MatteReader.sweep(place);
        Optional<Matte> within = place.ask("within").map(MatteReader::matte);
        return place.make(() -> new Stroke(brush, sweep, within));
    }

    private static Operation meshWarp(JsonPlace place) {
        place.only("kind", "handles", "grid", "cells", "within");
        if (place.has("handles") == place.has("grid")) {
            throw place.fault(place.has("grid") ? "both 'handles' and 'grid'" : "neither 'handles' nor 'grid'", "one of them",
                    place.has("grid") ? "remove one" : "add one");
        }
        WarpKind kind = place.ask("kind").map(p -> p.choice(WarpKind.class)).orElse(WarpKind.SPLINE);
        Optional<Matte> within = place.ask("within").map(MatteReader::matte);
        List<Handle> handles = place.has("grid") ? grid(place.need("grid"), within)
                : place.need("handles").items(kind.fewestHandles(), MeshWarp.MOST_HANDLES).stream().map(RetouchReader::handle).toList();
        if (place.has("cells") && kind != WarpKind.AS_RIGID_AS_POSSIBLE) {
            throw place.at("cells").fault("cells of a warp that has no mesh", "them only with the kind \"" + JsonPlace.word(
                    WarpKind.AS_RIGID_AS_POSSIBLE) + "\"", "remove them or give that kind");
        }
        Cells cells = place.ask("cells").map(RetouchReader::cells).orElse(Cells.USUAL);
        return place.make(() -> new MeshWarp(kind, handles, cells, within));
    }

    private static Cells cells(JsonPlace place) {
        List<JsonPlace> sides = place.items(2, 2);
        return new Cells(sides.get(0).whole(3, Cells.MOST), sides.get(1).whole(3, Cells.MOST));
    }

    private static List<Handle> grid(JsonPlace place, Optional<Matte> within) {
        place.only("columns", "rows", "box", "moved");
        int columns = place.need("columns").whole(1, MeshWarp.MOST_HANDLES);
        int rows = place.need("rows").whole(1, MeshWarp.MOST_HANDLES);
        List<HandleGrid.Moved> moved = place.need("moved").items(1, MeshWarp.MOST_HANDLES).stream().map(corner -> {
            corner.only("corner", "to");
            List<JsonPlace> at = corner.need("corner").items(2, 2);
            return new HandleGrid.Moved(at.get(0).whole(0, columns), at.get(1).whole(0, rows), MatteReader.point(corner.need("to")));
        }).toList();
        if (place.has("box")) {
            double[] sides = MatteReader.sides(place.need("box"));
            return place.make(() -> new HandleGrid(columns, rows, sides[0], sides[1], sides[2], sides[3], moved)).handles();
        }
        Matte region = within.orElseThrow(() -> place.fault("a grid with no place", "'box' here, or a region in 'within'", "add one"));
        return place.make(() -> HandleGrid.over(region, columns, rows, moved)).handles();
    }

    private static Operation outline(JsonPlace place) {
        place.only("level", "drags", "reach", "inside", "within");
        double level = place.ask("level").map(p -> p.number(0, 1)).orElse(0.25);
        double reach = place.ask("reach").map(p -> p.positive(OutlineWarp.LONGEST_REACH)).orElse(0.15);
        WarpKind inside = place.ask("inside").map(p -> p.choice(WarpKind.class)).orElse(WarpKind.SPLINE);
        List<Handle> drags = place.need("drags").items(1, OutlineWarp.MOST_DRAGS).stream().map(drag -> {
            drag.only("from", "to");
            return new Handle(MatteReader.point(drag.need("from")), MatteReader.point(drag.need("to")));
        }).toList();
        Optional<Matte> within = place.ask("within").map(MatteReader::matte);
        return place.make(() -> new OutlineWarp(level, drags, reach, inside, within));
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
