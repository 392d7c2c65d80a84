package org.wispwright.ui.shot;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Heat;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.optimize.flow.Pace;
import org.wispwright.optimize.flow.Side;
import org.wispwright.optimize.flow.Sides;
import org.wispwright.optimize.flow.Source;
import org.wispwright.optimize.flow.Start;
import org.wispwright.optimize.flow.Wind;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.render.march.Light;
import org.wispwright.render.march.Look;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Lens;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Pinhole;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;

/**
 * Reads {@code shot.json} (format: docs/shot-folder.md). Every section and every entry of a list is read on its own, so
 * one run finds a fault in each.
 */
final class SetupReader {
    /** The format that this program reads and writes. */
    static final int FORMAT = 1;
    static final double FAR = 1e6;
    private static final int MOST_CELLS_A_SIDE = 8192;
    private static final double MOST_DISPLACEMENT = 1000;
    private static final int MOST_VIEWS = 64;

    private final ShotFolder folder;
    private final Findings findings;
    private final long memoryBytes;

    SetupReader(ShotFolder folder, Findings findings, long memoryBytes) {
        this.folder = folder;
        this.findings = findings;
        this.memoryBytes = memoryBytes;
    }

    /** The shot without notes; empty if a finding was made. Parts that could be read are still checked. */
    Optional<Shot> read() {
        int before = findings.all().size();
        Optional<JsonPlace> file = findings.attempt(() -> JsonDoor.read(folder, "shot.json", JsonDoor.MOST_BYTES).version(FORMAT));
        if (file.isEmpty()) {
            return Optional.empty();
        }
        JsonPlace top = file.get();
        findings.check(() -> top.only("wispwright", "name", "grid", "frames", "flow", "sources", "obstacles", "start", "look",
                "background", "views"));
        Optional<String> name = findings.attempt(() -> top.need("name").text(200));
        Optional<FrameRange> frames = findings.attempt(() -> frames(top.need("frames")));
        Optional<GridShape> grid = findings.attempt(() -> grid(top, steps(top, frames)));
        List<Source> sources = new SourceReader(findings, frames).read(top);
        VolumeReader volumes = new VolumeReader(folder, memoryBytes);
        List<Obstacle> obstacles = new ObstacleReader(findings, volumes).read(top);
        Optional<Start> start = findings.attempt(() -> AirReader.start(top.ask("start"), grid, volumes));
        Optional<FlowSetup> flow = findings.attempt(() -> flow(top.ask("flow"), top, grid, frames, sources)).flatMap(f -> f)
                .map(f -> f.withObstacles(obstacles))
                .flatMap(f -> findings.attempt(() -> top.at("start").make(() -> f.withStart(start.orElse(Start.EMPTY)))));
        Optional<Look> look = findings.attempt(() -> look(top.need("look")));
        Optional<Rgb> background = findings.attempt(() -> top.ask("background").map(SetupReader::rgb).orElse(Rgb.BLACK));
        List<ShotView> views = views(top, frames);
        if (findings.all().size() > before) {
            return Optional.empty();
        }
        return Optional.of(new Shot(name.orElseThrow(), flow.orElseThrow(), look.orElseThrow(), background.orElseThrow(), views,
                List.of(), List.of(), List.of()));
    }

    /** Solver steps of the shot as far as they can be read; the flow section complains about substeps itself. */
    private static long steps(JsonPlace top, Optional<FrameRange> frames) {
        int substeps = new Findings().attempt(() -> top.need("flow").need("substeps").whole(1, Pace.MOST_SUBSTEPS)).orElse(1);
        return frames.map(f -> (long) f.count() * substeps).orElse(1L);
    }

    private GridShape grid(JsonPlace top, long steps) {
        JsonPlace place = top.need("grid");
        place.only("cells", "cellMetres", "originMetres");
        int[] cells = place.need("cells").items(3, 3).stream().mapToInt(c -> c.whole(1, MOST_CELLS_A_SIDE)).toArray();
        double cellMetres = place.need("cellMetres").positive(FAR);
        Vec3 origin = place.ask("originMetres").map(SetupReader::vec3).orElse(new Vec3(0, 0, 0));
        long count = (long) cells[0] * cells[1] * cells[2];
        boolean warm = new Findings().attempt(() -> top.need("flow").has("lift")).orElse(false);
        long more = MemoryNeed.ofSolids(count, top.has("obstacles")) + MemoryNeed.ofTemperature(count, steps, warm);
        MemoryNeed.require(place.need("cells"), cells, cellMetres, steps, memoryBytes - more);
        return place.make(() -> new GridShape(cells[0], cells[1], cells[2], cellMetres, origin.x(), origin.y(), origin.z()));
    }

    private static FrameRange frames(JsonPlace place) {
        place.only("first", "last", "perSecond");
        int first = place.need("first").whole(0, Integer.MAX_VALUE);
        int last = place.need("last").whole(0, Integer.MAX_VALUE);
        double perSecond = place.need("perSecond").positive(1000);
        return place.make(() -> new FrameRange(first, last, perSecond));
    }

    private Optional<FlowSetup> flow(Optional<JsonPlace> given, JsonPlace top, Optional<GridShape> grid, Optional<FrameRange> frames,
            List<Source> sources) {
        given.ifPresent(p -> p.only("substeps", "largestDisplacementCells", "velocityInterpolation", "densityInterpolation", "sides", "buoyancy", "dissipation",
                "lift", "cooling", "wind"));
        Pace pace = given.map(SetupReader::pace).orElse(Pace.of(1));
        Interpolation velocity = given.flatMap(p -> p.ask("velocityInterpolation")).map(p -> p.choice(Interpolation.class))
                .orElse(Interpolation.LINEAR);
        Interpolation density = given.flatMap(p -> p.ask("densityInterpolation")).map(p -> p.choice(Interpolation.class))
                .orElse(Interpolation.CUBIC);
        Sides sides = given.flatMap(p -> p.ask("sides")).map(SetupReader::sides).orElse(Sides.CLOSED);
        double buoyancy = given.flatMap(p -> p.ask("buoyancy")).map(p -> p.number(-1000, 1000)).orElse(0.0);
        double dissipation = given.flatMap(p -> p.ask("dissipation")).map(p -> p.number(0, 1000)).orElse(0.0);
        double lift = given.flatMap(p -> p.ask("lift")).map(p -> p.number(-1000, 1000)).orElse(0.0);
        double cooling = given.flatMap(p -> p.ask("cooling")).map(p -> p.number(0, 1000)).orElse(0.0);
        Wind wind = given.flatMap(p -> p.ask("wind")).map(AirReader::wind).orElse(Wind.NONE);
        if (grid.isEmpty() || frames.isEmpty()) {
            return Optional.empty();
        }
        JsonPlace place = given.orElse(top);
        // The sources come last: whether they may give warmth is for the whole to say.
        FlowSetup plain = place.make(() -> new FlowSetup(grid.get(), frames.get(), 1, velocity, density, sides, buoyancy,
                dissipation,
                List.of()));
        return Optional.of(place.make(() -> plain.withPace(pace).withHeat(new Heat(lift, cooling)).withWind(wind).withSources(sources)));
    }

    private static Pace pace(JsonPlace flow) {
        if (flow.has("substeps") && flow.has("largestDisplacementCells")) {
            throw flow.fault("both 'substeps' and 'largestDisplacementCells'", "one of them", "remove the other");
        }
        return flow.ask("largestDisplacementCells").map(p -> Pace.within(p.positive(MOST_DISPLACEMENT)))
                .orElseGet(() -> Pace.of(flow.ask("substeps").map(p -> p.whole(1, Pace.MOST_SUBSTEPS)).orElse(1)));
    }

    private static Sides sides(JsonPlace place) {
        place.only("left", "right", "floor", "top", "back", "front");
        return new Sides(side(place, "left"), side(place, "right"), side(place, "floor"), side(place, "top"), side(place, "back"),
                side(place, "front"));
    }

    private static Side side(JsonPlace place, String key) {
        return place.need(key).choice(Side.class);
    }

    private static Look look(JsonPlace place) {
        place.only("extinctionPerMetre", "albedo", "ambient", "light");
        double extinction = place.need("extinctionPerMetre").positive(1e6);
        Rgb albedo = place.ask("albedo").map(p -> rgb(p, 1)).orElse(Rgb.grey(0.9));
        Rgb ambient = place.ask("ambient").map(SetupReader::rgb).orElse(Rgb.grey(1));
        Optional<Light> light = place.ask("light").map(p -> {
            p.only("towards", "radiance");
            Vec3 towards = vec3(p.need("towards"));
            Rgb radiance = rgb(p.need("radiance"));
            return p.make(() -> new Light(towards, radiance));
        });
        return place.make(() -> new Look(extinction, albedo, ambient, light));
    }

    private List<ShotView> views(JsonPlace top, Optional<FrameRange> frames) {
        List<ShotView> views = new ArrayList<>();
        Set<String> names = new HashSet<>();
        for (JsonPlace place : findings.attempt(() -> top.need("views").items(1, MOST_VIEWS)).orElse(List.of())) {
            findings.attempt(() -> view(place, frames)).ifPresent(view -> {
                if (!names.add(view.view().name())) {
                    findings.add(place.at("name").fault("the name '" + view.view().name() + "' a second time",
                            "a name of its own for every view", "rename one").finding());
                }
                views.add(view);
            });
        }
        return views;
    }

    private ShotView view(JsonPlace place, Optional<FrameRange> frames) {
        place.only("name", "lens", "positionMetres", "aimMetres", "up", "raster", "rendered");
        String name = place.need("name").text(100);
        Lens lens = lens(place.need("lens"));
        Vec3 position = vec3(place.need("positionMetres"));
        Vec3 aim = vec3(place.need("aimMetres"));
        Vec3 up = place.ask("up").map(SetupReader::vec3).orElse(new Vec3(0, 1, 0));
        List<JsonPlace> sides = place.need("raster").items(2, 2);
        int width = sides.get(0).whole(1, Picture.LONGEST_SIDE);
        int height = sides.get(1).whole(1, Picture.LONGEST_SIDE);
        View view = place.make(() -> new View(name, lens, position, aim, up, new Raster(width, height)));
        return new ShotView(view, place.ask("rendered").map(p -> rendered(p, frames)).orElse(new TreeMap<>()));
    }

    private static Lens lens(JsonPlace place) {
        place.only("focalMm", "gateMm", "orthographicMetres");
        if (place.has("orthographicMetres")) {
            if (place.has("focalMm") || place.has("gateMm")) {
                throw place.fault("both kinds of lens", "either focalMm with gateMm, or orthographicMetres", "remove one of them");
            }
            List<JsonPlace> field = place.need("orthographicMetres").items(2, 2);
            return new Orthographic(field.get(0).positive(FAR), field.get(1).positive(FAR));
        }
        double focal = place.need("focalMm").positive(1e5);
        List<JsonPlace> gate = place.need("gateMm").items(2, 2);
        return new Pinhole(focal, gate.get(0).positive(1e4), gate.get(1).positive(1e4));
    }

    private SortedMap<Integer, String> rendered(JsonPlace place, Optional<FrameRange> frames) {
        SortedMap<Integer, String> files = new TreeMap<>();
        for (String key : place.keys()) {
            findings.check(() -> {
                int frame = frameKey(place.at(key), key);
                if (frames.isPresent() && !frames.get().contains(frame)) {
                    throw place.at(key).fault("frame " + frame, "a frame of the shot, " + frames.get().first() + " to "
                            + frames.get().last(), "remove it or correct the frame");
                }
                files.put(frame, ShotFolder.named(place.at(key)));
            });
        }
        return files;
    }

    private static int frameKey(JsonPlace place, String key) {
        if (!key.matches("[0-9]{1,9}")) {
            throw place.fault("the key '" + key + "'", "a frame number in quotes", "write for example \"1030\"");
        }
        return Integer.parseInt(key);
    }

    /** Two frame numbers, the second not before the first. */
    static int[] span(JsonPlace place) {
        List<JsonPlace> ends = place.items(2, 2);
        int first = ends.get(0).whole(0, Integer.MAX_VALUE);
        return new int[] {first, ends.get(1).whole(first, Integer.MAX_VALUE)};
    }

    static Vec3 vec3(JsonPlace place) {
        double[] v = place.numbers(3, -FAR, FAR);
        return new Vec3(v[0], v[1], v[2]);
    }

    static Rgb rgb(JsonPlace place) {
        return rgb(place, 1e4);
    }

    private static Rgb rgb(JsonPlace place, double most) {
        double[] v = place.numbers(3, 0, most);
        return new Rgb(v[0], v[1], v[2]);
    }
}
