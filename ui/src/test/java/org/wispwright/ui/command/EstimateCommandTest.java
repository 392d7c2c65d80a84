package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.SortedMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What a solve is said to take, and states on disk. Expectations: ours; bytes by hand. */
class EstimateCommandTest {
    @TempDir
    private Path place;

    /** A state of 8x16x8 cells: 4 (1024 + 9*16*8 + 8*17*8 + 8*16*9) = 17664 bytes. 29 steps keep 6 in little memory; 22 more of use. */
    private SmallShot longer() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.swap("shot.json", "\"last\": 1006", "\"last\": 1030");
        shot.swap("notes/open.json", "\"frame\": 1006", "\"frame\": 1030");
        shot.swap("notes/open.json", "[1003, 1006]", "[1003, 1030]");
        return shot;
    }

    @Test
    void eachQualityIsSaidAndNothingWritten() throws IOException {
        SmallShot shot = longer();
        SortedMap<String, String> before = SmallShot.listing(place);
        Run run = Run.of("estimate", shot.folder().toString(), "--memory", "100M", "--disk", "10M", "--json");
        assertEquals(0, run.code(), run.err());
        JsonNode estimates = new ObjectMapper().readTree(run.out()).get("estimates");
        assertEquals(3, estimates.size());
        JsonNode last = estimates.get(2);
        assertEquals("final", last.get("quality").asText());
        assertEquals(28, last.get("states").asInt());
        assertEquals(28 - 6, last.get("statesOnDisk").asInt());
        assertEquals(22 * 17664, last.get("diskBytes").asInt());
        assertEquals(2 * 30 * 4 * 1024, last.get("takeBytes").asInt());
        assertTrue(last.get("seconds").asDouble() > 0);
        assertTrue(last.get("memoryBytes").asLong() >= (96L << 20) + 1024 * 212 + 6 * 17664, last::toString);
        assertEquals(before, SmallShot.listing(place));
        Run one = Run.of("estimate", shot.folder().toString(), "--quality", "preview");
        assertTrue(one.out().startsWith("preview") && one.out().lines().count() == 1, one.out());
        assertEquals(2, Run.of("estimate", shot.folder().toString(), "--quality", "best").code());
    }

    /** The take has the same bytes, the file is gone, and the solve said beforehand what it would take. */
    @Test
    void aSolveWithStatesOnDiskHasTheSameBytes() throws IOException {
        SmallShot shot = longer();
        List<String> solve = List.of("solve", shot.folder().toString(), "--memory", "100M", "--until", "iterations=1");
        Run plain = Run.of(solve.toArray(new String[0]));
        assertEquals(0, plain.code(), plain.err());
        assertTrue(plain.err().contains("estimate: final"), plain.err());
        Run disk = Run.of("solve", shot.folder().toString(), "--memory", "100M", "--until", "iterations=1", "--disk", "10M");
        assertEquals(0, disk.code(), disk.err());
        assertTrue(disk.err().contains("of disk while it runs"), disk.err());
        Path takes = shot.folder().resolve("takes");
        assertEquals(-1, Files.mismatch(takes.resolve("001/density.1030.npy"), takes.resolve("002/density.1030.npy")));
        assertFalse(Files.exists(takes.resolve(".solving")));
    }

    /** A folder in the file's place refuses it as a full disk does: one sentence, 3, and what was there stays. */
    @Test
    void aDiskThatRefusesEndsItWithOneSentence() throws IOException {
        SmallShot shot = longer();
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        Path states = Files.createDirectories(shot.folder().resolve("takes/.solving/states"));
        Files.writeString(states.resolve("kept"), "x");
        Run run = Run.of("solve", shot.folder().toString(), "--memory", "100M", "--disk", "10M");
        assertEquals(ExitCodes.BAD_INPUT, run.code(), run.err());
        String last = run.err().lines().filter(line -> line.startsWith("wispwright: ")).reduce((a, b) -> b).orElseThrow();
        Refused.assertOneSentence(last, "takes/.solving/states", "give more memory");
        assertTrue(Files.exists(states.resolve("kept")));
        assertFalse(Files.exists(shot.folder().resolve("takes/001")));
    }

    @Test
    void aSizeThatIsNoneIsWrongUsage() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        assertEquals(2, Run.of("solve", shot.folder().toString(), "--disk", "much").code());
        assertEquals(2, Run.of("estimate", shot.folder().toString(), "--disk", "-1G").code());
        shot.delete("notes/lean.json");
        shot.delete("notes/open.json");
        Refused.by(place, List.of("estimate", shot.folder().toString()), "no note");
    }
}
