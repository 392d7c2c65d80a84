package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.SortedMap;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.DisabledOnOs;
import org.junit.jupiter.api.condition.OS;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.SolveWork;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.SolvePlace;

/**
 * Solves that are cut off and gone on with, through the real command. Expected values are ours: those of a solve that nothing disturbed.
 */
class ResumeCommandTest {
    private static final String[] FEW = {"--until", "iterations=9", "--threads", "1"};

    @TempDir
    private Path place;

    @Test
    void stoppedAndResumedItIsTheTakeOfOneRun() {
        SmallShot calm = SmallShot.in(place.resolve("calm"));
        assertEquals(0, solve(calm).code());
        SmallShot yard = SmallShot.in(place.resolve("yard"));
        stopAtIteration(yard, 4);
        Run refused = solve(yard);
        assertEquals(3, refused.code());
        assertTrue(refused.err().contains("iteration 4") && refused.err().contains("--resume") && refused.err().contains("--anew"),
                refused.err());
        Run rest = solve(yard, "--resume");
        assertEquals(0, rest.code(), rest.err());
        assertEquals(SmallShot.listing(calm.folder().resolve("takes")), SmallShot.listing(yard.folder().resolve("takes")));
        Run nothing = solve(yard, "--resume");
        assertEquals(3, nothing.code());
        assertTrue(nothing.err().contains("no record"), nothing.err());
    }

    @Test
    void aDamagedRecordGivesWayAndAChangedShotIsRefused() throws IOException {
        SmallShot calm = SmallShot.in(place.resolve("calm"));
        assertEquals(0, solve(calm).code());
        SmallShot yard = SmallShot.in(place.resolve("yard"));
        stopAtIteration(yard, 5);
        String words = Files.readString(yard.folder().resolve("notes/open.json"));
        yard.swap("notes/open.json", "\"radius\": 0.1", "\"radius\": 0.11");
        SortedMap<String, String> before = withoutLock(yard);
        Run changed = solve(yard, "--resume");
        assertEquals(3, changed.code());
        assertTrue(changed.err().contains("has changed since"), changed.err());
        assertEquals(before, withoutLock(yard));
        yard.write("notes/open.json", words);
        Path newer = yard.folder().resolve("takes/.solving/record-1.bin");
        byte[] bytes = Files.readAllBytes(newer);
        bytes[bytes.length / 2] ^= 4;
        Files.write(newer, bytes);
        Run rest = solve(yard, "--resume");
        assertEquals(0, rest.code(), rest.err());
        assertTrue(rest.err().contains("record-1.bin") && rest.err().contains("after iteration 4"), rest.err());
        assertEquals(SmallShot.listing(calm.folder().resolve("takes")), SmallShot.listing(yard.folder().resolve("takes")));
    }

    @Test
    void onlyDamagedRecordsSaySoAndAnewBeginsAgain() throws IOException {
        SmallShot yard = SmallShot.in(place.resolve("yard"));
        stopAtIteration(yard, 1);
        Files.write(yard.folder().resolve("takes/.solving/record-1.bin"), new byte[] {1, 2, 3});
        Run damaged = solve(yard, "--resume");
        assertEquals(3, damaged.code());
        assertTrue(damaged.err().contains("only damaged records"), damaged.err());
        stopAtIteration(yard, 2);
        assertEquals(0, solve(yard, "--anew").code());
        assertTrue(Files.isDirectory(yard.folder().resolve("takes/001")));
        assertFalse(Files.exists(yard.folder().resolve("takes/.solving")));
        assertEquals(2, solve(yard, "--anew", "--resume").code());
    }

    @Test
    void twoSolvesOfOneShotExcludeEachOther() {
        SmallShot yard = SmallShot.in(place.resolve("yard"));
        assertEquals(0, Run.of("simulate", yard.folder().toString()).code());
        try (SolvePlace taken = SolvePlace.open(ShotFolder.open(yard.folder()))) {
            assertTrue(Files.isDirectory(taken.file(".")));
            Run second = solve(yard);
            assertEquals(3, second.code());
            assertTrue(second.err().contains("another solve at work"), second.err());
        }
        assertEquals(0, solve(yard).code());
    }

    /** A first look goes on to the whole: the same force as a whole solve. */
    @Test
    void aPreviewIsGoneOnWith() throws IOException {
        SmallShot calm = finer("calm");
        String[] most = {"--until", "iterations=45", "--threads", "2"};
        assertEquals(0, Run.of(with(most, "solve", calm.folder().toString())).code());
        SmallShot yard = finer("yard");
        Run preview = Run.of(with(most, "solve", yard.folder().toString(), "--quality", "preview"));
        assertEquals(0, preview.code(), preview.err());
        assertFalse(preview.err().contains("rung 2"), preview.err());
        Run whole = Run.of(with(most, "solve", yard.folder().toString(), "--from", "1"));
        assertEquals(0, whole.code(), whole.err());
        assertTrue(whole.err().contains("rung 2/2"), whole.err());
        assertEquals(-1, Files.mismatch(calm.folder().resolve("takes/001/force.npy"), yard.folder().resolve("takes/002/force.npy")));
        Run lower = Run.of(with(most, "solve", yard.folder().toString(), "--from", "2", "--quality", "preview"));
        assertEquals(3, lower.code());
        assertTrue(lower.err().contains("rung 2"), lower.err());
        assertEquals(3, Run.of(with(most, "solve", yard.folder().toString(), "--from", "0")).code());
        assertEquals(3, Run.of(with(most, "solve", yard.folder().toString(), "--from", "7")).code());
        assertEquals(2, Run.of("solve", yard.folder().toString(), "--quality", "best").code());
    }

    /** kill -9 in a real process, a few times over, at moments that the machine chooses. */
    @Test
    @DisabledOnOs(OS.WINDOWS)
    void killedAgainAndAgainItEndsWithTheSameBits() throws IOException, InterruptedException {
        SmallShot calm = SmallShot.in(place.resolve("calm"));
        assertEquals(0, solve(calm).code());
        SmallShot yard = SmallShot.in(place.resolve("yard"));
        assertEquals(0, Run.of("simulate", yard.folder().toString()).code());
        for (int n = 0; n < 3; n++) {
            Path records = yard.folder().resolve("takes/.solving");
            Process process = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(), "-cp",
                    System.getProperty("surefire.test.class.path", System.getProperty("java.class.path")),
                    "org.wispwright.ui.command.Main", "solve", yard.folder().toString(), "--until", "iterations=9", "--threads", "1",
                    Files.exists(records.resolve("record-1.bin")) ? "--resume" : "--anew").redirectErrorStream(true)
                            .redirectOutput(place.resolve("said.txt").toFile()).start();
            for (int wait = 0; wait < 600 && process.isAlive() && !Files.exists(records.resolve("record-1.bin")); wait++) {
                Thread.sleep(20);
            }
            Thread.sleep(5L + 30 * n);
            process.destroyForcibly();
            assertTrue(process.waitFor(30, TimeUnit.SECONDS));
        }
        // The last process may have come to its end before it was killed.
        if (!Files.exists(yard.folder().resolve("takes/001"))) {
            Run rest = solve(yard, "--resume");
            assertEquals(0, rest.code(), rest.err());
        }
        for (String file : new String[] {"force.npy", "take.json", "density.1006.npy"}) {
            assertEquals(-1, Files.mismatch(calm.folder().resolve("takes/001").resolve(file),
                    yard.folder().resolve("takes/001").resolve(file)),
                    file);
        }
    }

    private SmallShot finer(String name) {
        SmallShot shot = SmallShot.in(place.resolve(name));
        shot.swap("shot.json", "\"cells\": [8, 16, 8], \"cellMetres\": 0.25", "\"cells\": [24, 48, 24], \"cellMetres\": 0.0834");
        shot.swap("shot.json", "\"velocityInterpolation\": \"cubic\",", "");
        return shot;
    }

    private static void stopAtIteration(SmallShot shot, int iteration) {
        Cancel cancel = new Cancel();
        Progress stopping = new Progress() {
            @Override
            public void now(String line) {
                if (line.contains(" iteration " + iteration + ",")) {
                    cancel.wish();
                }
            }

            @Override
            public void milestone(String line) {
                now(line);
            }
        };
        try (Lanes lanes = new Lanes(1)) {
            SolveWork.Manner manner = new SolveWork.Manner(64L << 20, new StopRule(0, Double.POSITIVE_INFINITY, 9), true);
            SolveWork.run(ShotFolder.open(shot.folder()), ShotCheck.require(shot.folder(), 1L << 30), manner, lanes, stopping, cancel);
        } catch (Cancel.Cancelled asked) {
            assertTrue(Files.isDirectory(shot.folder().resolve("takes/.solving")));
            assertFalse(Files.exists(shot.folder().resolve("takes/001")));
        }
    }

    private static SortedMap<String, String> withoutLock(SmallShot shot) {
        SortedMap<String, String> all = SmallShot.listing(shot.folder());
        all.remove("takes/.solving/in-use.lock");
        return all;
    }

    private static Run solve(SmallShot shot, String... more) {
        return Run.of(with(more, with(FEW, "solve", shot.folder().toString())));
    }

    private static String[] with(String[] more, String... first) {
        String[] all = java.util.Arrays.copyOf(first, first.length + more.length);
        System.arraycopy(more, 0, all, first.length, more.length);
        return all;
    }
}
