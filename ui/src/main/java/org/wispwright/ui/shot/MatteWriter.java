package org.wispwright.ui.shot;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import org.wispwright.warp.matte.BrushedMatte;
import org.wispwright.warp.matte.CombinedMatte;
import org.wispwright.warp.matte.DensityRange;
import org.wispwright.warp.matte.ImageMatte;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Sweep;

/** Mattes and positions as {@link MatteReader} reads them: the same values, to the bit. */
final class MatteWriter {
    private MatteWriter() {
    }

    /** @throws IllegalArgumentException if there is no way to write this kind */
    static ObjectNode matte(Matte matte) {
        ObjectNode object = JsonNodeFactory.instance.objectNode();
        if (matte instanceof Region.Rectangle r) {
            object.putObject("rectangle").put("left", r.left()).put("top", r.top()).put("right", r.right()).put("bottom", r.bottom());
        } else if (matte instanceof Region.Ellipse e) {
            ObjectNode ellipse = object.putObject("ellipse");
            ellipse.set("centre", point(e.centre()));
            ellipse.putArray("radii").add(e.radiusX()).add(e.radiusY());
        } else if (matte instanceof Region.Polygon p) {
            ArrayNode corners = object.putArray("polygon");
            p.outline().forEach(corner -> corners.add(point(corner)));
        } else if (matte instanceof DensityRange d) {
            object.putObject("density").put("from", d.from()).put("to", d.to()).put("soft", d.soft());
            return object.put("feather", d.feather());
        } else if (matte instanceof BrushedMatte b) {
            ArrayNode dabs = object.putArray("brushed");
            b.dabs().forEach(dab -> sweep(dab.sweep(), dabs.addObject().put("brush", JsonPlace.word(dab.way()))));
            return object;
        } else if (matte instanceof CombinedMatte c) {
            if (c.way() == CombinedMatte.Way.INVERSE) {
                object.set("inverse", matte(c.parts().get(0)));
            } else {
                ArrayNode parts = object.putArray(JsonPlace.word(c.way()));
                c.parts().forEach(part -> parts.add(matte(part)));
            }
            return object;
        } else if (matte instanceof ImageMatte i && i.source().isPresent()) {
            object.putObject("image").put("file", i.source().get().file()).put("channel", JsonPlace.word(i.source().get().channel()));
            return object.put("feather", i.feather());
        } else {
            throw new IllegalArgumentException("matte: got a " + matte.getClass().getSimpleName() + ", which cannot be written");
        }
        return object.put("feather", ((Region) matte).feather());
    }

    /** A brush's width, strength, edge, line, pressure and spacing. */
    static void sweep(Sweep sweep, ObjectNode into) {
        into.put("radius", sweep.radius()).put("strength", sweep.strength()).put("softEdge", sweep.softEdge());
        ArrayNode line = into.putArray("line");
        sweep.line().forEach(point -> line.add(point(point)));
        if (!sweep.pressure().values().isEmpty()) {
            ArrayNode pressure = into.putArray("pressure");
            sweep.pressure().values().forEach(pressure::add);
            into.put("pressureOn", JsonPlace.word(sweep.pressure().on()));
        }
        if (sweep.spacing() > 0) {
            into.put("spacing", sweep.spacing());
        }
    }

    static ArrayNode point(Point point) {
        return JsonNodeFactory.instance.arrayNode().add(point.x()).add(point.y());
    }
}
