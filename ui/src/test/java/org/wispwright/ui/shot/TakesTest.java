package org.wispwright.ui.shot;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.time.Instant;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.optimize.flow.Sides;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.render.volume.GridShape;

class TakesTest {
    private static final GridShape BOX = new GridShape(3, 5, 2, 0.5);
    private static final FlowSetup FLOW = new FlowSetup(BOX, new FrameRange(1001, 1002, 24), 1, Interpolation.CUBIC, Interpolation.CUBIC,
            Sides.CLOSED, 1, 0, List.of());

    @TempDir
    private Path place;
    private Takes takes;

    @BeforeEach
    void aFolder() throws IOException {
        Files.writeString(place.resolve("shot.json"), "{}");
        takes = Takes.of(ShotFolder.open(place));
    }

    @Test
    void whatIsWrittenIsReadBackBitForBit() {
        SmokeState state = state();
        try (TakeDraft draft = takes.draft()) {
            draft.write(1001, state);
            draft.writeForce(new double[] {0.1, -3e-300, Math.PI});
            draft.finish(new TakeRecord(TakeRecord.Kind.SOLVE, "0.1.0", TakeRecord.digest(FLOW), TakeRecord.object().put("bands", 3),
                    TakeRecord.object().put("divergenceMax", 1e-7), List.of(1.0, 0.25)));
        }
        SmokeState back = takes.state(1, 1001, FLOW);
        assertArrayEquals(state.density().values(), back.density().values());
        assertArrayEquals(state.velocity().x(), back.velocity().x());
        assertArrayEquals(state.velocity().y(), back.velocity().y());
        assertArrayEquals(state.velocity().z(), back.velocity().z());
        assertArrayEquals(new double[] {0.1, -3e-300, Math.PI}, takes.force(1));
        TakeRecord record = takes.requireOf(1, FLOW);
        assertEquals(List.of(1.0, 0.25), record.losses());
        assertEquals(3, record.settings().get("bands").intValue());
    }

    @Test
    void aDraftThatIsClosedUnfinishedLeavesNothing() throws IOException {
        try (TakeDraft draft = takes.draft()) {
            draft.write(1001, state());
            assertTrue(takes.numbers().isEmpty());
        }
        try (Stream<Path> left = Files.list(place)) {
            assertEquals(List.of("shot.json"), left.map(p -> p.getFileName().toString()).toList());
        }
    }

    @Test
    void numbersGoUpAndNothingIsOverwritten() {
        original();
        assertEquals(1, solve());
        assertEquals(2, solve());
        assertEquals(List.of(0, 1, 2), takes.numbers());
        try (TakeDraft draft = takes.draft()) {
            assertThrows(ShotException.class, () -> draft.finishAsOriginal(TakeRecord.original("0.1.0", FLOW, 0.5)));
        }
        assertEquals(List.of(0, 1, 2), takes.numbers());
    }

    @Test
    void twoDraftsAtOnceBothArrive() {
        try (TakeDraft first = takes.draft(); TakeDraft second = takes.draft()) {
            assertEquals(1, second.finish(TakeRecord.original("0.1.0", FLOW, 0.5)));
            assertEquals(2, first.finish(TakeRecord.original("0.1.0", FLOW, 0.5)));
        }
    }

    /** A draft that a crash left has its lock file but nobody who holds the lock; one at work is not touched. */
    @Test
    void onlyTheLeftoversOfACrashAreSwept() throws IOException {
        Path crashed = Files.createDirectories(place.resolve("takes/.making-crashed"));
        Files.createFile(crashed.resolve("in-use.lock"));
        Files.writeString(crashed.resolve("density.1001.npy"), "half");
        Path bare = Files.createDirectories(place.resolve("takes/.making-bare"));
        Files.setLastModifiedTime(bare, FileTime.from(Instant.now().minusSeconds(3600)));
        try (TakeDraft atWork = takes.draft(); TakeDraft other = takes.draft()) {
            assertFalse(Files.exists(crashed));
            assertFalse(Files.exists(bare));
            atWork.write(1001, state());
            other.write(1001, state());
            assertEquals(1, atWork.finish(TakeRecord.original("0.1.0", FLOW, 0.5)));
        }
        assertEquals(List.of(1), takes.numbers());
    }

    @Test
    void theLockIsNoPartOfATake() throws IOException {
        original();
        try (Stream<Path> files = Files.list(place.resolve("takes/000"))) {
            assertEquals(List.of("take.json"), files.map(p -> p.getFileName().toString()).toList());
        }
    }

    @Test
    void theSetUpsDigestChangesWithAnyValue() {
        FlowSetup other = new FlowSetup(BOX, new FrameRange(1001, 1002, 24), 1, Interpolation.CUBIC, Interpolation.CUBIC, Sides.CLOSED,
                1.0000001, 0, List.of());
        assertFalse(TakeRecord.original("0.1.0", FLOW, 0.5).belongsTo(other));
        assertTrue(TakeRecord.original("0.1.0", FLOW, 0.5).belongsTo(FLOW));
    }

    @Test
    void aLossThatIsNoNumberIsRefused() {
        assertThrows(IllegalArgumentException.class, () -> new TakeRecord(TakeRecord.Kind.SOLVE, "0.1.0", "", TakeRecord.object(),
                TakeRecord.object(), List.of(Double.NaN)));
    }

    @Test
    void aValueThatIsNoNumberIsRefusedOnReading() {
        SmokeState state = state();
        state.density().values()[7] = Float.NaN;
        try (TakeDraft draft = takes.draft()) {
            draft.write(1001, state);
            draft.finish(TakeRecord.original("0.1.0", FLOW, 0.5));
        }
        ShotException refused = assertThrows(ShotException.class, () -> takes.density(1, 1001, FLOW));
        assertTrue(refused.getMessage().contains("density.1001.npy") && refused.getMessage().contains("NaN"), refused.getMessage());
    }

    private void original() {
        try (TakeDraft draft = takes.draft()) {
            draft.finishAsOriginal(TakeRecord.original("0.1.0", FLOW, 0.5));
        }
    }

    private int solve() {
        try (TakeDraft draft = takes.draft()) {
            return draft.finish(TakeRecord.original("0.1.0", FLOW, 0.5));
        }
    }

    private static SmokeState state() {
        SmokeState state = new SmokeState(BOX);
        for (float[] values : new float[][] {state.density().values(), state.velocity().x(), state.velocity().y(), state.velocity().z()}) {
            for (int n = 0; n < values.length; n++) {
                values[n] = (float) Math.sin(1 + 0.7 * n + values.length);
            }
        }
        return state;
    }
}
