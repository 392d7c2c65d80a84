package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeFalse;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.SortedMap;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.DisabledOnOs;
import org.junit.jupiter.api.condition.OS;
import org.junit.jupiter.api.io.TempDir;

/** Ctrl-C in a real process. Windows has no such signal to send. */
@DisabledOnOs(OS.WINDOWS)
class SignalTest {
    @TempDir
    private Path place;

    @Test
    void interruptEndsWith130AndLeavesNoHalfTake() throws IOException, InterruptedException {
        assumeFalse(interruptIsIgnored(), "this process was started with SIGINT ignored, and its children inherit that");
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.swap("shot.json", "\"cells\": [8, 16, 8], \"cellMetres\": 0.25", "\"cells\": [32, 64, 32], \"cellMetres\": 0.0625");
        shot.swap("shot.json", "\"last\": 1006", "\"last\": 2000");
        SortedMap<String, String> before = SmallShot.listing(shot.folder());
        Path said = place.resolve("said.txt");
        Process process = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(), "-cp", System.getProperty("surefire.test.class.path", System.getProperty("java.class.path")),
                "org.wispwright.ui.command.Main", "simulate", shot.folder().toString()).redirectErrorStream(true).redirectOutput(said.toFile()).start();
        try {
            Path takes = shot.folder().resolve("takes");
            for (int wait = 0; wait < 600 && !Files.exists(takes) && process.isAlive(); wait++) {
                Thread.sleep(50);
            }
            Thread.sleep(300);
            assertTrue(process.isAlive(), () -> "ended by itself: " + text(said));
            assertEquals(0, new ProcessBuilder("kill", "-INT", String.valueOf(process.pid())).start().waitFor());
            assertTrue(process.waitFor(30, TimeUnit.SECONDS), "did not stop");
            assertEquals(130, process.exitValue(), () -> text(said));
            assertEquals(before, SmallShot.listing(shot.folder()));
        } finally {
            process.destroyForcibly();
        }
    }

    /** A shell without job control starts what it puts in the background so (POSIX, 2.11); Linux tells it in SigIgn, bit 1. */
    private static boolean interruptIsIgnored() throws IOException {
        Path status = Path.of("/proc/self/status");
        if (!Files.isReadable(status)) {
            return false;
        }
        return Files.readAllLines(status).stream().filter(line -> line.startsWith("SigIgn:"))
                .anyMatch(line -> (Long.parseUnsignedLong(line.substring(7).strip(), 16) & 2) != 0);
    }

    private static String text(Path file) {
        try {
            return Files.readString(file);
        } catch (IOException broken) {
            return broken.toString();
        }
    }
}
