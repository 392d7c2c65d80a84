package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.List;

/** Every command that takes a shot, with what it needs beside it. */
final class ShotCommands {
    private ShotCommands() {
    }

    static List<List<String>> on(Path shot, Path out) {
        return List.of(
                List.of("check", shot.toString()),
                List.of("simulate", shot.toString()),
                List.of("picture", shot.toString(), "--take", "0", "--frame", "1004", "--view", "front", "--out", out + ".png"),
                List.of("solve", shot.toString(), "--until", "iterations=1"),
                List.of("estimate", shot.toString()),
                List.of("compare", shot.toString(), "--takes", "0,1", "--out", out.toString()));
    }
}
