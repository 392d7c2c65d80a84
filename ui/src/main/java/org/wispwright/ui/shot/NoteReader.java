package org.wispwright.ui.shot;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.Point;
import org.wispwright.warp.retouch.Region;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Stroke;

/** Reads {@code notes/<id>.json} (format: docs/shot-folder.md); positions are fractions of the picture's height. */
final class NoteReader {
    /** The most notes that a shot may have. */
    static final int MOST_NOTES = 1000;
    /** The most a note file may weigh: 4 MiB. */
    static final long MOST_BYTES = 4L << 20;
    /** What the name of a note file without its ending must match. */
    static final String ID = "[A-Za-z0-9][A-Za-z0-9_-]{0,63}";
    private static final int MOST_HOLDS = 100;
    private static final double FARTHEST = 100;

    private final ShotFolder folder;
    private final Findings findings;

    NoteReader(ShotFolder folder, Findings findings) {
        this.folder = folder;
        this.findings = findings;
    }

    /**
     * Notes in the order of their ids.
     *
     * @param on take part
     * @param off are read and checked all the same
     */
    record Notes(List<Note> on, List<Note> off) {
    }

    /** All notes that could be read; what could not be read is in the findings. */
    Notes read() {
        Notes notes = new Notes(new ArrayList<>(), new ArrayList<>());
        for (String name : findings.attempt(() -> folder.names("notes", ".json", MOST_NOTES)).orElse(List.of())) {
            String file = "notes/" + name;
            findings.check(() -> {
                JsonPlace top = JsonDoor.read(folder, file, MOST_BYTES);
                Note note = note(top, name);
                (isOn(top) ? notes.on() : notes.off()).add(note);
            });
        }
        return notes;
    }

    /** Whether the note takes part: the key {@code on}, true where it is not written. */
    static boolean isOn(JsonPlace top) {
        return top.ask("on").map(JsonPlace::truth).orElse(true);
    }

    /** The note of a file. @throws ShotException if it is not as it must be */
    static Note note(JsonPlace top, String fileName) {
        String id = fileName.substring(0, fileName.length() - ".json".length());
        if (!id.matches(ID)) {
            throw top.fault("the file name '" + fileName + "'", "letters, digits, '-' and '_' before .json, at most 64", "rename the file");
        }
        top.version(SetupReader.FORMAT).only("wispwright", "on", "words", "frame", "view", "weight", "retouch", "holds");
        String words = top.need("words").text(2000);
        int frame = top.need("frame").whole(0, Integer.MAX_VALUE);
        String view = top.need("view").text(100);
        double weight = top.ask("weight").map(p -> p.positive(1000)).orElse(1.0);
        JsonPlace list = top.need("retouch");
        List<Operation> operations = list.items(1, Retouch.MOST_OPERATIONS).stream().map(NoteReader::operation).toList();
        List<Hold> holds = new ArrayList<>();
        if (top.has("holds")) {
            for (JsonPlace place : top.need("holds").items(0, MOST_HOLDS)) {
                holds.add(hold(place, frame));
            }
        }
        return top.make(() -> new Note(id, words, frame, view, weight, list.make(() -> new Retouch(operations)), holds));
    }

    private static Hold hold(JsonPlace place, int noteFrame) {
        place.only("region", "frames");
        Region region = region(place.need("region"));
        int[] span = place.ask("frames").map(SetupReader::span).orElse(new int[] {noteFrame, noteFrame});
        return new Hold(region, span[0], span[1]);
    }

    private static Operation operation(JsonPlace place) {
        place.only("stroke", "meshWarp");
        if (place.keys().size() != 1) {
            throw place.fault(place.keys().size() + " operations in one entry", "one: stroke or meshWarp", "give each an entry of its own");
        }
        return place.has("stroke") ? stroke(place.need("stroke")) : meshWarp(place.need("meshWarp"));
    }

    private static Operation stroke(JsonPlace place) {
        place.only("brush", "radius", "strength", "softEdge", "line", "within");
        Brush brush = place.need("brush").choice(Brush.class);
        double radius = place.need("radius").positive(1);
        double strength = place.ask("strength").map(p -> p.number(0, 1)).orElse(1.0);
        double softEdge = place.ask("softEdge").map(p -> p.number(0, 1)).orElse(0.5);
        List<Point> line = place.need("line").items(1, Stroke.MOST_POINTS).stream().map(NoteReader::point).toList();
        Optional<Region> within = place.ask("within").map(NoteReader::region);
        return place.make(() -> new Stroke(brush, radius, strength, softEdge, line, within));
    }

    private static Operation meshWarp(JsonPlace place) {
        place.only("handles", "within");
        List<Handle> handles = place.need("handles").items(3, MeshWarp.MOST_HANDLES).stream().map(NoteReader::handle).toList();
        Optional<Region> within = place.ask("within").map(NoteReader::region);
        return place.make(() -> new MeshWarp(handles, within));
    }

    private static Handle handle(JsonPlace place) {
        place.only("from", "to", "pin");
        if (!place.has("pin")) {
            return new Handle(point(place.need("from")), point(place.need("to")));
        }
        if (place.has("from") || place.has("to")) {
            throw place.fault("a pin that is also pulled", "either 'pin', or 'from' and 'to'", "remove one of them");
        }
        return Handle.pin(point(place.need("pin")));
    }

    private static Region region(JsonPlace place) {
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
        List<Point> corners = place.items(3, Region.Polygon.MOST_POINTS).stream().map(NoteReader::point).toList();
        return place.make(() -> new Region.Polygon(corners, feather));
    }

    private static Point point(JsonPlace place) {
        List<JsonPlace> xy = place.items(2, 2);
        return new Point(coordinate(xy.get(0)), coordinate(xy.get(1)));
    }

    private static double coordinate(JsonPlace place) {
        return place.number(-FARTHEST, FARTHEST);
    }
}
