package org.wispwright.ui.shot;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.SerializationFeature;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.file.FileVisitResult;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.SimpleFileVisitor;
import java.nio.file.attribute.BasicFileAttributes;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/**
 * A shot that is to be made: what a person says of it before there is a folder. It is checked like any other shot before the folder gets its
 * name, so there is a whole shot or none.
 *
 * @param name       for people; the folder's name is made of it
 * @param first      first frame
 * @param last       last frame
 * @param perSecond  frames a second
 * @param cells      along x, y, z
 * @param cellMetres side of a cell
 * @param source     where smoke comes from; empty if it is all there at the start
 * @param buoyancy   upward acceleration of smoke of density 1, m/s2
 * @param dissipation decay of density, 1/s
 * @param extinction absorption of density 1, 1/m
 * @param view       the camera
 * @param frames     frame number to a picture that was rendered through it; copied in
 * @param start      an NPY file with the density of the first frame; copied in
 */
public record ShotDraft(String name, int first, int last, double perSecond, List<Integer> cells, double cellMetres,
                        Optional<Source> source, double buoyancy, double dissipation, double extinction, Camera view,
                        SortedMap<Integer, Path> frames, Optional<Path> start) {
    private static final ObjectMapper JSON = JsonMapper.builder().enable(SerializationFeature.INDENT_OUTPUT).build();
    private static final Pattern NUMBERED = Pattern.compile("(?i)^.*?([0-9]{1,9})\\.(png|exr)$");

    /**
     * A ball that gives off smoke.
     *
     * @param centre metres
     * @param radius metres
     * @param rate   density a second
     */
    public record Source(List<Double> centre, double radius, double rate) {
    }

    /**
     * The camera.
     *
     * @param name     of the view
     * @param focalMm  focal length
     * @param gateMm   width of the film gate; its height follows from the raster
     * @param position metres
     * @param aim      metres
     * @param width    pixels
     * @param height   pixels
     */
    public record Camera(String name, double focalMm, double gateMm, List<Double> position, List<Double> aim, int width, int height) {
    }

    /** Pictures of a folder by the number before their ending; the first in the order of names where two have one number. */
    public static SortedMap<Integer, Path> numbered(Path folder) throws IOException {
        SortedMap<Integer, Path> found = new TreeMap<>();
        try (Stream<Path> files = Files.list(folder)) {
            for (Path file : (Iterable<Path>) files.sorted()::iterator) {
                Matcher m = NUMBERED.matcher(file.getFileName().toString());
                if (m.matches() && Files.isRegularFile(file)) {
                    found.putIfAbsent(Integer.valueOf(m.group(1)), file);
                }
            }
        }
        return found;
    }

    /**
     * Makes the shot folder.
     *
     * @param below the folder that it comes into
     * @return the new folder
     * @throws ShotException with the first thing that is wrong, or if the place is taken or cannot be written to; then there is no folder
     */
    public Path write(Path below) {
        String folderName = name.strip().toLowerCase(java.util.Locale.ROOT).replaceAll("[^a-z0-9]+", "-").replaceAll("^-|-$", "");
        Path there = below.resolve(folderName.isEmpty() ? "shot" : folderName);
        if (Files.exists(there)) {
            throw new ShotException(Finding.of(there.toString(), "", "something of this name already", "a free name",
                    "give the shot another name, or another place"));
        }
        Path making = below.resolve(".making-" + there.getFileName());
        try {
            remove(making);
            Files.createDirectories(making.resolve("notes"));
            copyIn(making);
            Files.writeString(making.resolve("shot.json"), JSON.writeValueAsString(json()) + "\n");
            ShotCheck.Result checked = ShotCheck.of(making, Runtime.getRuntime().maxMemory());
            if (!checked.findings().isEmpty()) {
                remove(making);
                throw new ShotException(checked.findings().get(0));
            }
            Files.move(making, there);
            return there;
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException(impossible);
        } catch (IOException refused) {
            throw NoteFiles.cannotWrite(there.toString(), refused);
        }
    }

    private void copyIn(Path making) throws IOException {
        if (!frames.isEmpty()) {
            Files.createDirectories(making.resolve("frames"));
        }
        for (Map.Entry<Integer, Path> frame : inRange().entrySet()) {
            Files.copy(frame.getValue(), making.resolve(frameFile(frame.getKey())));
        }
        if (start.isPresent()) {
            Files.createDirectories(making.resolve("volumes"));
            Files.copy(start.get(), making.resolve("volumes/start.npy"));
        }
    }

    private SortedMap<Integer, Path> inRange() {
        return frames.subMap(first, last + 1);
    }

    private String frameFile(int frame) {
        String file = frames.get(frame).getFileName().toString();
        return "frames/" + view.name() + "." + frame + file.substring(file.lastIndexOf('.')).toLowerCase(java.util.Locale.ROOT);
    }

    private ObjectNode json() {
        ObjectNode top = JSON.createObjectNode().put("wispwright", SetupReader.FORMAT).put("name", name.strip());
        ObjectNode grid = top.putObject("grid");
        ArrayNode count = grid.putArray("cells");
        cells.forEach(count::add);
        grid.put("cellMetres", cellMetres);
        top.putObject("frames").put("first", first).put("last", last).put("perSecond", perSecond);
        ObjectNode flow = top.putObject("flow");
        flow.putObject("sides").put("left", "open").put("right", "open").put("floor", "wall").put("top", "open").put("back", "open")
                .put("front", "open");
        flow.put("buoyancy", buoyancy).put("dissipation", dissipation);
        ArrayNode sources = top.putArray("sources");
        source.ifPresent(s -> {
            ObjectNode one = sources.addObject().put("name", "source");
            numbers(one, "centreMetres", s.centre());
            one.put("radiusMetres", s.radius()).put("ratePerSecond", s.rate());
        });
        start.ifPresent(file -> top.putObject("start").put("density", "volumes/start.npy"));
        ObjectNode look = top.putObject("look").put("extinctionPerMetre", extinction);
        numbers(look, "albedo", List.of(0.9, 0.9, 0.9));
        numbers(look, "ambient", List.of(0.3, 0.3, 0.3));
        ObjectNode light = look.putObject("light");
        numbers(light, "towards", List.of(-0.6, 1.0, 0.6));
        numbers(light, "radiance", List.of(0.9, 0.9, 0.9));
        numbers(top, "background", List.of(0.06, 0.06, 0.06));
        ObjectNode camera = top.putArray("views").addObject().put("name", view.name());
        ObjectNode lens = camera.putObject("lens").put("focalMm", view.focalMm());
        numbers(lens, "gateMm", List.of(view.gateMm(), view.gateMm() * view.height() / view.width()));
        numbers(camera, "positionMetres", view.position());
        numbers(camera, "aimMetres", view.aim());
        camera.putArray("raster").add(view.width()).add(view.height());
        if (!inRange().isEmpty()) {
            ObjectNode rendered = camera.putObject("rendered");
            inRange().keySet().forEach(frame -> rendered.put(String.valueOf(frame), frameFile(frame)));
        }
        return top;
    }

    private static void numbers(ObjectNode object, String key, List<Double> values) {
        ArrayNode array = object.putArray(key);
        values.forEach(array::add);
    }

    private static void remove(Path folder) throws IOException {
        if (!Files.exists(folder)) {
            return;
        }
        Files.walkFileTree(folder, new SimpleFileVisitor<>() {
            @Override
            public FileVisitResult visitFile(Path file, BasicFileAttributes attributes) throws IOException {
                Files.delete(file);
                return FileVisitResult.CONTINUE;
            }

            @Override
            public FileVisitResult postVisitDirectory(Path emptied, IOException failed) throws IOException {
                Files.delete(emptied);
                return FileVisitResult.CONTINUE;
            }
        });
    }
}
