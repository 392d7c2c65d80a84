package org.wispwright.ui.shot;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.solve.SolveRecords;
import org.wispwright.optimize.solve.SolveState;
import org.wispwright.render.volume.ScalarGrid;

/**
 * The takes of a shot: {@code takes/000} is the original, each solve adds one, none is ever overwritten. A take is there
 * whole or not at all: it grows in a {@link TakeDraft} and gets its name by one rename.
 */
public final class Takes {
    /** Highest number a take may have. */
    public static final int LAST = 999;

    private final ShotFolder folder;

    private Takes(ShotFolder folder) {
        this.folder = folder;
    }

    /** The takes of a shot folder; there may be none yet. */
    public static Takes of(ShotFolder folder) {
        return new Takes(folder);
    }

    /** "007". */
    public static String name(int number) {
        return String.format(Locale.ROOT, "%03d", number);
    }

    /** True if there is such a take. */
    public boolean has(int number) {
        return number >= 0 && number <= LAST && Files.isDirectory(folder.inside("takes/" + name(number)));
    }

    /** Numbers of all takes, lowest first. */
    public List<Integer> numbers() {
        Path takes = folder.inside("takes");
        if (!Files.isDirectory(takes)) {
            return List.of();
        }
        try (Stream<Path> entries = Files.list(takes)) {
            return entries.filter(Files::isDirectory).map(p -> p.getFileName().toString()).filter(n -> n.matches("[0-9]{3}"))
                    .map(Integer::valueOf).sorted().toList();
        } catch (IOException unreadable) {
            throw new ShotException(Finding.of("takes", "", "a folder that cannot be listed", "a readable folder",
                    "check its permissions"), unreadable);
        }
    }

    /**
     * Where a take comes from.
     *
     * @throws ShotException if there is no such take, or its take.json is not as it must be
     */
    public TakeRecord record(int number) {
        require(number);
        return TakeRecord.read(JsonDoor.read(folder, file(number, "take.json"), JsonDoor.MOST_BYTES));
    }

    /**
     * Refuses a take that was made with another set-up than the shot now has.
     *
     * @throws ShotException if it does not belong, or there is none
     */
    public TakeRecord requireOf(int number, FlowSetup flow) {
        TakeRecord record = record(number);
        if (!record.belongsTo(flow)) {
            throw new ShotException(Finding.of(file(number, "take.json"), "/setupSha256",
                    "a take that was made with another set-up than shot.json has now",
                    "a take of this set-up", number == 0 ? "move the folder takes away and simulate again"
                            : "solve again, or put shot.json back as it was"));
        }
        return record;
    }

    /**
     * The flow with the number of substeps that its original was found to need, if it states a largest displacement and that original is
     * there; otherwise as it is.
     *
     * @throws ShotException if the original does not say
     */
    public FlowSetup paced(FlowSetup flow) {
        if (!flow.pace().isOpen() || !has(0)) {
            return flow;
        }
        TakeRecord original = record(0);
        if (!original.belongsTo(flow)) {
            return flow;
        }
        return flow.withPace(flow.pace().found(original.substeps().orElseThrow(() -> new ShotException(Finding.of(file(0, "take.json"),
                "/figures/" + TakeRecord.SUBSTEPS, "no number of substeps", "the number that was found from flow.largestDisplacementCells",
                "move the folder takes away and simulate again")))));
    }

    /**
     * The density of a frame.
     *
     * @throws ShotException if the take or the file is missing, damaged, or of another grid than the shot
     */
    public ScalarGrid density(int number, int frame, FlowSetup flow) {
        require(number);
        return TakeVolumes.density(folder, "takes/" + name(number), frame, flow.grid());
    }

    /**
     * Density and velocity of a frame.
     *
     * @throws ShotException as {@link #density}
     */
    public SmokeState state(int number, int frame, FlowSetup flow) {
        require(number);
        return TakeVolumes.state(folder, "takes/" + name(number), frame, flow.grid());
    }

    /**
     * The coefficients of a take's force, in the order of its basis.
     *
     * @throws ShotException if the take has none, or the file is damaged
     */
    public double[] force(int number) {
        require(number);
        return TakeVolumes.force(folder, "takes/" + name(number));
    }

    /**
     * Where the search of a take ended.
     *
     * @throws ShotException if there is no such take, it was not solved, or the file is damaged
     */
    public SolveState search(int number) {
        require(number);
        String where = file(number, SolveRecords.ONLY);
        try {
            SolveRecords.Found found = new SolveRecords(folder.inside("takes/" + name(number))).latest();
            return found.state().orElseThrow(() -> new ShotException(Finding.of(where, "", found.damaged().isEmpty() ? "no such file"
                    : "a damaged record", "where the search of a solved take ended", "give another take, or solve without --from")));
        } catch (IOException unreadable) {
            throw new ShotException(Finding.of(where, "", "a file that cannot be read", "a readable file", "check its permissions"),
                    unreadable);
        }
    }

    /**
     * Begins a take, after sweeping away what crashed runs left.
     *
     * @throws ShotException if the folder cannot be written to
     */
    public TakeDraft draft() {
        return TakeDraft.begin(folder.inside("takes"));
    }

    private void require(int number) {
        if (!has(number)) {
            List<Integer> there = numbers();
            throw new ShotException(Finding.of("takes/" + name(number), "", "no such take", there.isEmpty() ? "a take of the shot"
                    : "one of " + there,
                    there.isEmpty() ? "run 'simulate' first, it makes take 0" : "give a number that exists"));
        }
    }

    private static String file(int number, String name) {
        return "takes/" + name(number) + "/" + name;
    }
}
