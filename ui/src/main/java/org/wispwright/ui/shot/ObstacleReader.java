package org.wispwright.ui.shot;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.Solid;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.NpyFile;

/** Reads {@code obstacles}: solid things, still or moved by keys. */
final class ObstacleReader {
    private static final double FAR = 1e6;
    private static final Vec3 ZERO = new Vec3(0, 0, 0);
    private static final String[] FORMS = {"box", "ball", "cylinder", "volume"};

    private final Findings findings;
    private final VolumeReader volumes;

    ObstacleReader(Findings findings, VolumeReader volumes) {
        this.findings = findings;
        this.volumes = volumes;
    }

    /** The obstacles that could be read; what could not is among the findings. */
    List<Obstacle> read(JsonPlace top) {
        List<Obstacle> obstacles = new ArrayList<>();
        Set<String> names = new HashSet<>();
        List<JsonPlace> places = findings.attempt(() -> top.ask("obstacles").map(p -> p.items(0, Obstacle.MOST)).orElse(List.of()))
                .orElse(List.of());
        for (JsonPlace place : places) {
            findings.attempt(() -> obstacle(place)).ifPresent(obstacle -> {
                if (!names.add(obstacle.name())) {
                    findings.add(place.at("name").fault("the name '" + obstacle.name() + "' a second time",
                            "a name of its own for every obstacle", "rename one").finding());
                }
                obstacles.add(obstacle);
            });
        }
        return obstacles;
    }

    private Obstacle obstacle(JsonPlace place) {
        place.only("name", "box", "ball", "cylinder", "volume", "positionMetres", "rotationRadians", "keys");
        String name = place.need("name").text(100);
        Solid solid = solid(place);
        MotionReader.requireOne(place, "positionMetres");
        if (place.has("keys") && place.has("rotationRadians")) {
            throw place.at("rotationRadians").fault("a rotation beside keys", "rotations in the keys", "move it into the keys");
        }
        if (!place.has("keys")) {
            Vec3 position = SetupReader.vec3(place.need("positionMetres"));
            Vec3 rotation = rotation(place);
            return place.make(() -> new Obstacle(name, solid, Curve.still(position), Curve.still(rotation)));
        }
        JsonPlace keys = place.need("keys");
        Curve position = MotionReader.curve(keys, key -> {
            key.only("frame", "positionMetres", "rotationRadians");
            return SetupReader.vec3(key.need("positionMetres"));
        });
        Curve rotation = MotionReader.curve(keys, ObstacleReader::rotation);
        return place.make(() -> new Obstacle(name, solid, position, rotation));
    }

    private static Vec3 rotation(JsonPlace place) {
        return place.ask("rotationRadians").map(p -> {
            double[] r = p.numbers(3, -1e4, 1e4);
            return new Vec3(r[0], r[1], r[2]);
        }).orElse(ZERO);
    }

    private Solid solid(JsonPlace place) {
        List<String> forms = new ArrayList<>();
        for (String form : FORMS) {
            if (place.has(form)) {
                forms.add(form);
            }
        }
        if (forms.size() != 1) {
            throw place.fault(forms.isEmpty() ? "no form" : "more than one form: " + String.join(", ", forms),
                    "one of " + String.join(", ", FORMS), forms.isEmpty() ? "add one" : "keep one");
        }
        JsonPlace form = place.need(forms.get(0));
        switch (forms.get(0)) {
            case "box":
                form.only("sizeMetres");
                List<JsonPlace> sides = form.need("sizeMetres").items(3, 3);
                double[] half = sides.stream().mapToDouble(side -> side.positive(FAR) / 2).toArray();
                return form.make(() -> new Solid.Box(new Vec3(half[0], half[1], half[2])));
            case "ball":
                form.only("radiusMetres");
                return form.make(() -> new Solid.Ball(form.need("radiusMetres").positive(FAR)));
            case "cylinder":
                form.only("radiusMetres", "lengthMetres");
                return form.make(() -> new Solid.Cylinder(form.need("radiusMetres").positive(FAR),
                        form.need("lengthMetres").positive(FAR) / 2));
            default:
                return volume(form);
        }
    }

    private Solid volume(JsonPlace form) {
        form.only("file", "holds", "cellMetres");
        Solid.Volume.Kind kind = form.need("holds").choice(Solid.Volume.Kind.class);
        double cell = form.need("cellMetres").positive(FAR);
        NpyFile.Contents contents = volumes.read(form.need("file"));
        int[] sizes = contents.shape();
        if (kind == Solid.Volume.Kind.MASK) {
            for (float value : contents.values()) {
                if (!(value >= 0 && value <= 1)) {
                    throw form.at("file").fault("a mask with the value " + value, "values from 0 to 1",
                            "write the share of solid of each cell");
                }
            }
        }
        return form.make(() -> new Solid.Volume(new GridShape(sizes[2], sizes[1], sizes[0], cell), contents.values(), kind));
    }
}
