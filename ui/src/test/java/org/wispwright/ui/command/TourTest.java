package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.net.URI;
import java.nio.file.FileSystem;
import java.nio.file.FileSystems;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.SortedMap;
import java.util.stream.Stream;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.SolveWork;
import org.wispwright.ui.job.TourWork;

class TourTest {
    private static final SolveWork.Manner SHORT = new SolveWork.Manner(256L << 20, new StopRule(0, 1000, 2), true);

    @TempDir
    private Path place;

    /** From inside a jar, as in the program itself. */
    @Test
    void theTourLeavesTheShotTheSheetAndTheReport() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        Path out = place.resolve("out");
        URI jar = URI.create("jar:" + place.resolve("samples.jar").toUri());
        try (FileSystem inside = FileSystems.newFileSystem(jar, Map.of("create", "true")); Lanes lanes = new Lanes(2)) {
            Path sample = inside.getPath("/samples/yard");
            Files.createDirectories(sample.getParent());
            copy(shot.folder(), sample);
            TourWork.run(sample, out, SHORT, lanes, Progress.SILENT, new Cancel());
        }
        JsonNode report = new ObjectMapper().readTree(out.resolve("report.json").toFile());
        for (String key : new String[] {"divergenceMax", "massRatio", "forceRms", "gradients", "seconds", "peakMemoryBytes", "bands",
                "departure"}) {
            assertTrue(report.has(key), key);
        }
        assertEquals(2, report.get("notes").size());
        assertTrue(ImageIO.read(out.resolve("sheet.png").toFile()).getWidth() > 1000);
        assertTrue(Files.isRegularFile(out.resolve("yard/takes/001/take.json")));
        assertEquals(0, Run.of("check", out.resolve("yard").toString()).code());
    }

    @Test
    void aFolderWithSomethingInItIsLeftAlone() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        Path out = Files.createDirectory(place.resolve("out"));
        Files.writeString(out.resolve("mine.txt"), "mine");
        SortedMap<String, String> before = SmallShot.listing(place);
        try (Lanes lanes = new Lanes(1)) {
            ShotException refused = assertThrows(ShotException.class,
                    () -> TourWork.run(shot.folder(), out, SHORT, lanes, Progress.SILENT, new Cancel()));
            assertTrue(refused.getMessage().contains("not empty"), refused.getMessage());
        }
        assertEquals(before, SmallShot.listing(place));
    }

    private static void copy(Path from, Path to) throws IOException {
        try (Stream<Path> paths = Files.walk(from)) {
            for (Path path : paths.toList()) {
                Path there = to.resolve(from.relativize(path).toString());
                if (Files.isDirectory(path)) {
                    Files.createDirectories(there);
                } else {
                    Files.copy(path, there);
                }
            }
        }
    }
}
