package org.wispwright.ui.shot;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Source;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.render.view.Vec3;

/** Reads {@code sources}: balls and boxes that give off smoke, still or moved by keys. */
final class SourceReader {
    private static final int MOST_SOURCES = 256;

    private final Findings findings;
    private final Optional<FrameRange> range;

    SourceReader(Findings findings, Optional<FrameRange> range) {
        this.findings = findings;
        this.range = range;
    }

    /** The sources that could be read; what could not is among the findings. */
    List<Source> read(JsonPlace top) {
        List<Source> sources = new ArrayList<>();
        Set<String> names = new HashSet<>();
        List<JsonPlace> places = findings.attempt(() -> top.need("sources").items(0, MOST_SOURCES)).orElse(List.of());
        for (JsonPlace place : places) {
            findings.attempt(() -> source(place)).ifPresent(source -> {
                if (!names.add(source.name())) {
                    findings.add(place.at("name").fault("the name '" + source.name() + "' a second time",
                            "a name of its own for every source", "rename one").finding());
                }
                sources.add(source);
            });
        }
        return sources;
    }

    private Source source(JsonPlace place) {
        place.only("name", "centreMetres", "keys", "radiusMetres", "boxMetres", "edgeMetres", "ratePerSecond", "kelvinPerSecond",
                "frames");
        String name = place.need("name").text(100);
        if (place.has("radiusMetres") && place.has("boxMetres")) {
            throw place.fault("both 'radiusMetres' and 'boxMetres'", "a ball or a box", "remove one of them");
        }
        Curve centre = centre(place);
        Source.Form form;
        if (place.has("boxMetres")) {
            double[] half = place.need("boxMetres").items(3, 3).stream().mapToDouble(side -> side.positive(SetupReader.FAR) / 2).toArray();
            form = Source.Form.box(new Vec3(half[0], half[1], half[2]));
        } else {
            form = Source.Form.ball(place.need("radiusMetres").positive(SetupReader.FAR));
        }
        double least = Math.min(form.half().x(), Math.min(form.half().y(), form.half().z()));
        double edge = place.ask("edgeMetres").map(p -> p.number(0, least)).orElse(least / 2);
        double rate = place.need("ratePerSecond").number(0, 1e6);
        double kelvin = place.ask("kelvinPerSecond").map(p -> p.number(-1e5, 1e5)).orElse(0.0);
        int[] frames = place.ask("frames").map(SetupReader::span)
                .orElseGet(() -> range.map(r -> new int[] {r.first(), r.last()}).orElse(new int[] {0, 0}));
        return place.make(() -> new Source(name, form, centre, edge, rate, kelvin, frames[0], frames[1]));
    }

    private static Curve centre(JsonPlace place) {
        if (!place.has("keys")) {
            return Curve.still(SetupReader.vec3(place.need("centreMetres")));
        }
        MotionReader.requireOne(place, "centreMetres");
        return MotionReader.curve(place.need("keys"), key -> {
            key.only("frame", "centreMetres");
            return SetupReader.vec3(key.need("centreMetres"));
        });
    }
}
