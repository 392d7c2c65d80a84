package org.wispwright.optimize.solve;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.force.Band;
import org.wispwright.optimize.search.Lbfgs;
import org.wispwright.render.volume.GridShape;

/** What is expected is ours: every bit comes back, and a record with any fault in it gives way to the one before it. */
class SolveRecordsTest {
    @TempDir
    Path folder;

    @Test
    void everyBitComesBack() throws IOException {
        SolveRecords records = new SolveRecords(folder);
        SolveState state = state(7);
        records.write(state);
        SolveState back = records.latest().state().orElseThrow();
        assertArrayEquals(encoded(state), encoded(back));
        assertArrayEquals(state.search().s()[1], back.search().s()[1]);
        assertEquals(state.runs(), back.runs());
        assertEquals(state.losses(), back.losses());
    }

    @Test
    void theNewerOfTwoCounts() throws IOException {
        SolveRecords records = new SolveRecords(folder);
        for (int n = 3; n < 8; n++) {
            records.write(state(n));
            assertEquals(n, records.latest().state().orElseThrow().search().iterations());
        }
        records.clear();
        assertTrue(records.latest().state().isEmpty());
        assertTrue(records.latest().damaged().isEmpty());
    }

    /** One bit flipped at each byte in turn, and a cut at each length, must both be seen. */
    @Test
    void aDamagedRecordGivesWayToTheOneBefore() throws IOException {
        SolveRecords records = new SolveRecords(folder);
        records.write(state(4));
        records.write(state(5));
        Path newer = folder.resolve("record-1.bin");
        byte[] whole = Files.readAllBytes(newer);
        for (int at = 0; at < whole.length; at++) {
            byte[] bad = whole.clone();
            bad[at] ^= (byte) (1 << at % 8);
            Files.write(newer, bad);
            assertFallsBack(records, "byte " + at);
            Files.write(newer, Arrays.copyOf(whole, at));
            assertFallsBack(records, "cut to " + at);
        }
        Files.write(newer, Arrays.copyOf(whole, whole.length + 1));
        assertFallsBack(records, "one byte more");
        Files.write(folder.resolve("record-0.bin"), new byte[0]);
        assertTrue(records.latest().state().isEmpty());
        assertEquals(2, records.latest().damaged().size());
    }

    private static byte[] encoded(SolveState state) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        SolveRecords.encode(state, bytes);
        return bytes.toByteArray();
    }

    private static void assertFallsBack(SolveRecords records, String what) throws IOException {
        SolveRecords.Found found = records.latest();
        assertEquals(4, found.state().orElseThrow().search().iterations(), what);
        assertEquals(1, found.damaged().size(), what);
    }

    private static SolveState state(int iterations) {
        Random random = new Random(iterations);
        double[] x = random.doubles(5).toArray();
        double[][] s = {random.doubles(5).toArray(), random.doubles(5).toArray()};
        double[][] y = {random.doubles(5).toArray(), random.doubles(5).toArray()};
        Lbfgs.State search = new Lbfgs.State(x, -0.0, random.doubles(5).toArray(), 1e-300, s, y, iterations, 12, 0.5);
        return new SolveState("abc", 2, 1, 3, 4, 0.5, 9.25, search, List.of(1.0, 0.5), List.of(0.1 + 0.2),
                List.of(new SolveResult.BandRun(new GridShape(4, 6, 4, 0.1, 0, -1, 2), new Band(0, 1.5, 5), 20, 3, 4, 0.7, 1.5)), "");
    }
}
