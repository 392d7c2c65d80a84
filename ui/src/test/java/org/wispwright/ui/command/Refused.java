package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;

/** What a command owes when its input is bad: one sentence, exit code 3, nothing changed on disk. */
final class Refused {
    private Refused() {
    }

    /** Runs every command that takes a shot, with these options; each must refuse with a sentence that holds the phrases. */
    static void byAll(SmallShot shot, Path place, List<String> options, String... phrases) {
        for (List<String> command : ShotCommands.on(shot.folder(), place.resolve("out"))) {
            List<String> args = new ArrayList<>(command);
            args.addAll(options);
            by(place, args, phrases);
        }
    }

    /** Runs one command, which must refuse. */
    static void by(Path place, List<String> args, String... phrases) {
        SortedMap<String, String> before = SmallShot.listing(place);
        Run run = Run.of(args.toArray(new String[0]));
        assertEquals(ExitCodes.BAD_INPUT, run.code(), args + ": " + run.err());
        assertOneSentence(run.err(), phrases);
        assertEquals(before, SmallShot.listing(place), args + " changed something on disk");
    }

    static void assertOneSentence(String err, String... phrases) {
        String line = err.strip();
        assertEquals(1, line.lines().count(), err);
        assertTrue(line.startsWith("wispwright: ") && line.endsWith("."), err);
        assertFalse(line.contains("Exception") || line.contains("\tat ") || line.contains("java."), err);
        for (String phrase : phrases) {
            assertTrue(line.contains(phrase), "'" + phrase + "' is not in: " + err);
        }
    }
}
