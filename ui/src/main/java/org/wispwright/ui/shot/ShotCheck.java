package org.wispwright.ui.shot;

import java.nio.file.Path;
import java.util.DoubleSummaryStatistics;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.ToDoubleFunction;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Source;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;

/**
 * Validates a whole shot folder before any work: what every command does first, and all that {@code check} does. Finds
 * all faults that can be told apart, not only the first. Reads; writes nothing.
 */
public final class ShotCheck {
    /** The most rows at which a view is tried for whether it sees the box. */
    private static final int MOST_ROWS_TRIED = 1080;

    private final ShotFolder folder;
    private final long memoryBytes;
    private final Findings findings = new Findings();

    /**
     * What came out.
     *
     * @param shot the shot; empty if there is a finding
     * @param findings what is wrong; empty if nothing is
     */
    public record Result(Optional<Shot> shot, List<Finding> findings) {
        /** Keeps a copy. */
        public Result {
            findings = List.copyOf(findings);
        }
    }

    private ShotCheck(ShotFolder folder, long memoryBytes) {
        this.folder = folder;
        this.memoryBytes = memoryBytes;
    }

    /**
     * Checks a folder.
     *
     * @param folder the shot folder
     * @param memoryBytes what a solve may take
     */
    public static Result of(Path folder, long memoryBytes) {
        try {
            return new ShotCheck(ShotFolder.open(folder), memoryBytes).run(true);
        } catch (ShotException noFolder) {
            return new Result(Optional.empty(), List.of(noFolder.finding()));
        }
    }

    /**
     * The checked shot.
     *
     * @throws ShotException with the first finding, if there is any
     */
    public static Shot require(Path folder, long memoryBytes) {
        Result result = of(folder, memoryBytes);
        if (result.findings().isEmpty()) {
            return result.shot().orElseThrow();
        }
        throw new ShotException(result.findings().get(0));
    }

    /**
     * The set-up and the notes, checked as always, but without opening a rendered frame or asking for a solve's memory: what it
     * takes to work on notes.
     *
     * @throws ShotException with the first finding, if there is any
     */
    public static Shot requireForNotes(ShotFolder folder) {
        ShotCheck check = new ShotCheck(folder, Long.MAX_VALUE);
        Result result = check.run(false);
        check.findings.throwFirst();
        return result.shot().orElseThrow();
    }

    /** Refuses a note, or the pictures it names, that does not fit the shot. @throws ShotException with the first finding */
    static void requireFits(Note note, MattePictures pictures, Shot shot) {
        Findings findings = new Findings();
        checkNote(note, pictures, shot, findings);
        findings.throwFirst();
    }

    private Result run(boolean pictures) {
        MattePictures mattes = new MattePictures(folder, memoryBytes);
        Optional<Shot> setup = new SetupReader(folder, findings, memoryBytes).read();
        NoteReader.Notes notes = new NoteReader(folder, mattes, findings).read();
        List<Hold> holds = findings.attempt(() -> HoldReader.ofShot(folder, mattes, setup.map(s -> s.flow().frames()))).orElse(List.of());
        setup.ifPresent(shot -> {
            checkSources(shot);
            checkObstacles(shot);
            if (pictures) {
                checkViews(shot);
            }
            notes.on().forEach(note -> checkNote(note, mattes, shot, findings));
            notes.off().forEach(note -> checkNote(note, mattes, shot, findings));
            HoldCheck.ofShot(holds, notes.on(), mattes, shot, findings);
        });
        Optional<Shot> whole = setup.filter(s -> findings.none())
                .flatMap(s -> findings.attempt(() -> Takes.of(folder).paced(s.flow())).map(s::withFlow))
                .map(s -> new Shot(s.name(), s.flow(), s.look(), s.background(), s.views(), notes.on(), notes.off(), holds));
        return new Result(whole, findings.all());
    }

    private void checkSources(Shot shot) {
        GridShape box = shot.flow().grid();
        List<Source> sources = shot.flow().sources();
        for (int n = 0; n < sources.size(); n++) {
            Source s = sources.get(n);
            Vec3 half = s.form().half();
            boolean reaches = reaches(s.centre(), Vec3::x, box.originX(), box.nx() * box.cellMetres(), half.x())
                    && reaches(s.centre(), Vec3::y, box.originY(), box.ny() * box.cellMetres(), half.y())
                    && (box.isPlane() || reaches(s.centre(), Vec3::z, box.originZ(), box.nz() * box.cellMetres(), half.z()));
            if (!reaches) {
                findings.add(Finding.of("shot.json", "/sources/" + n, "source '" + s.name() + "' outside the box",
                        "a source that reaches into it", "move it to within " + middle(box)));
            }
        }
    }

    private void checkObstacles(Shot shot) {
        GridShape box = shot.flow().grid();
        List<Obstacle> obstacles = shot.flow().obstacles();
        for (int n = 0; n < obstacles.size(); n++) {
            Obstacle o = obstacles.get(n);
            double reach = o.solid().reach(box.cellMetres());
            boolean meets = reaches(o.position(), Vec3::x, box.originX(), box.nx() * box.cellMetres(), reach)
                    && reaches(o.position(), Vec3::y, box.originY(), box.ny() * box.cellMetres(), reach)
                    && (box.isPlane() || reaches(o.position(), Vec3::z, box.originZ(), box.nz() * box.cellMetres(), reach));
            if (!meets) {
                findings.add(Finding.of("shot.json", "/obstacles/" + n, "obstacle '" + o.name() + "' outside the box at every frame",
                        "a thing that reaches into it", "move it to within " + middle(box)));
            }
        }
    }

    /** True unless something of that reach about a moving place stays outside the box: between keys the place swings past none. */
    private static boolean reaches(Curve place, ToDoubleFunction<Vec3> axis, double low, double length, double reach) {
        DoubleSummaryStatistics along = place.values().stream().mapToDouble(axis).summaryStatistics();
        return along.getMin() - reach < low + length && along.getMax() + reach > low;
    }

    private static String middle(GridShape box) {
        double h = box.cellMetres();
        return String.format(Locale.ROOT, "x %.4g to %.4g, y %.4g to %.4g, z %.4g to %.4g m", box.originX(), box.originX() + box.nx() * h,
                box.originY(), box.originY() + box.ny() * h, box.originZ(), box.originZ() + box.nz() * h);
    }

    private void checkViews(Shot shot) {
        GridShape box = shot.flow().grid();
        for (int n = 0; n < shot.views().size(); n++) {
            ShotView view = shot.views().get(n);
            String pointer = "/views/" + n;
            Raster raster = view.view().raster();
            findings.check(() -> requirePixels((long) raster.width() * raster.height(), pointer + "/raster", "a raster of "
                    + raster.inWords(), "make it smaller"));
            int rows = Math.min(view.view().raster().height(), MOST_ROWS_TRIED);
            View tried = rows == view.view().raster().height() ? view.view() : view.view().withRasterHeight(rows);
            if (!tried.sees(box)) {
                findings.add(Finding.of("shot.json", pointer, "view '" + view.view().name() + "', in which no pixel sees the box",
                        "a view of the box", "aim it at the box, which spans " + middle(box)));
            }
            for (Map.Entry<Integer, String> rendered : view.rendered().entrySet()) {
                findings.check(() -> checkRendered(view.view(), rendered.getValue(), pointer + "/rendered/" + rendered.getKey()));
            }
        }
    }

    private void checkRendered(View view, String file, String pointer) {
        RenderedFrame.StatedSize size = RenderedFrame.statedSize(folder, file, "shot.json", pointer);
        size.requireAspect(view, file, "shot.json", pointer, "render it again with this aspect, or correct the view's raster and lens");
        requirePixels(size.width() * size.height(), pointer, "picture '" + file + "' of " + size.inWords(), "render it smaller");
        RenderedFrame.read(folder, file, pointer);
    }

    private void requirePixels(long pixels, String pointer, String what, String wayOut) {
        long need = MemoryNeed.ofPicture(pixels);
        if (need > memoryBytes) {
            throw new ShotException(Finding.of("shot.json", pointer, what + ", which takes " + MemoryNeed.inWords(need),
                    "one that fits into " + MemoryNeed.inWords(memoryBytes), wayOut + ", or " + MemoryNeed.giveMore(need)));
        }
    }

    private static void checkNote(Note note, MattePictures mattes, Shot shot, Findings findings) {
        String file = "notes/" + note.id() + ".json";
        FrameRange frames = shot.flow().frames();
        String range = frames.first() + " to " + frames.last();
        if (!frames.contains(note.frame())) {
            findings.add(Finding.of(file, "/frame", "frame " + note.frame(), "a frame of the shot, " + range,
                    "correct the frame, or lengthen the shot"));
        } else if (note.frame() == frames.first()) {
            findings.add(Finding.of(file, "/frame", "the first frame, " + note.frame() + ", which no force can change",
                    "a later frame, up to " + frames.last(), "correct the frame"));
        }
        if (shot.view(note.view()).isEmpty()) {
            List<String> names = shot.views().stream().map(v -> v.view().name()).toList();
            findings.add(Finding.of(file, "/view", "view '" + note.view() + "', which the shot does not have", "one of "
                    + String.join(", ", names),
                    NearestWord.to(note.view(), names).map(near -> "did you mean '" + near + "'").orElse("correct the name")));
        }
        HoldCheck.ofNote(note, mattes, shot, findings);
    }
}
