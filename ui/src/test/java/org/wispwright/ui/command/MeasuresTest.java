package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.render.volume.NpyFile;

/**
 * The figures of {@code compare} on a shot whose pictures are known: one layer of 16 x 16 cells of 1 m seen along z, a pixel a cell, no
 * light but an even one, so a cell of density ln 2 is a pixel of alpha 1/2 and of 1/2 in every colour. Take 0 shows a block, columns
 * 4 to 7 by rows 4 to 11, from frame 2 on; take 1 shows the same on frame 2 and columns 5 to 7 alone on frames 3 and 4. The note on
 * frame 3 removes columns 4 and 5, so columns 6 and 7 are wanted. All that is expected below is counted by hand from these blocks.
 */
class MeasuresTest {
    private static final String SETUP = """
            {"wispwright": 1, "name": "Blocks", "grid": {"cells": [16, 16, 1], "cellMetres": 1, "originMetres": [0, 0, 0]},
             "frames": {"first": 1, "last": 4, "perSecond": 24},
             "flow": {"sides": {"left": "wall", "right": "wall", "floor": "wall", "top": "wall", "back": "wall", "front": "wall"}},
             "sources": [], "look": {"extinctionPerMetre": 1, "albedo": [1, 1, 1], "ambient": [1, 1, 1]},
             "views": [{"name": "front", "lens": {"orthographicMetres": [16, 16]}, "positionMetres": [8, 8, 20],
                        "aimMetres": [8, 8, 0.5], "raster": [16, 16]}]}
            """;
    private static final String NOTE = """
            {"wispwright": 1, "words": "Narrower.", "frame": 3, "view": "front",
             "retouch": [{"stroke": {"brush": "remove", "radius": 1, "softEdge": 0, "line": [[0.5, 0.5]],
                "within": {"rectangle": {"left": 0.25, "top": -1, "right": 0.375, "bottom": 2}, "feather": 0}}}],
             "holds": [{"region": {"rectangle": {"left": -1, "top": 0.75, "right": 2, "bottom": 2}, "feather": 0}},
                       {"region": {"density": {}}, "frames": [4, 4]}]}
            """;

    @TempDir
    private Path place;
    private Path folder;

    @BeforeEach
    void twoTakes() throws IOException {
        folder = Files.createDirectories(place.resolve("blocks"));
        Files.createDirectories(folder.resolve("notes"));
        Files.writeString(folder.resolve("shot.json"), SETUP);
        Files.writeString(folder.resolve("notes/narrow.json"), NOTE);
        Run made = Run.of("simulate", folder.toString());
        assertEquals(0, made.code(), made.err());
        Path other = Files.createDirectories(folder.resolve("takes/001"));
        try (Stream<Path> files = Files.list(folder.resolve("takes/000"))) {
            for (Path file : files.toList()) {
                Files.copy(file, other.resolve(file.getFileName()));
            }
        }
        for (int frame = 2; frame <= 4; frame++) {
            block(0, frame, 4);
            block(1, frame, frame == 2 ? 4 : 5);
        }
    }

    private void block(int take, int frame, int left) throws IOException {
        float[] density = new float[256];
        for (int j = 4; j < 12; j++) {
            Arrays.fill(density, 16 * j + left, 16 * j + 8, (float) Math.log(2));
        }
        NpyFile.write(folder.resolve(String.format("takes/%03d/density.%04d.npy", take, frame)), new int[] {1, 16, 16}, density);
    }

    private JsonNode compared() throws IOException {
        Path out = place.resolve("review");
        Run run = Run.of("compare", folder.toString(), "--takes", "0,1", "--out", out.toString());
        assertEquals(0, run.code(), run.err());
        return new ObjectMapper().readTree(out.resolve("compare.json").toFile());
    }

    @Test
    void regionByRegion() throws IOException {
        JsonNode report = compared();
        assertEquals(0.1, report.get("silhouetteLevel").doubleValue());
        JsonNode measures = report.get("measures");
        assertEquals(List.of("frame", "retouched", "hold 1", "elsewhere"),
                Stream.of(0, 1, 2, 3).map(n -> measures.get(n).get("region").textValue()).toList());
        assertEquals(4, measures.size());
        assertEquals("narrow", measures.get(0).get("note").textValue());
        // Wanted 16 pixels, the original 32 with all of them: 16 differ by 1/2, mse 16/4/256 = 1/64. Column 4 is 2 pixels away, 5 is 1, so
        // chamfer (2 + 1) / 4. Quarters at 4, 5, 6, 7 go to halves at 6, 7: (2 + 1 + 1 + 0) / 4 of a pixel.
        likeness(measures.get(0).get("original"), 10 * Math.log10(64), 0.03125, 0.5, 2, 0.75, 1);
        // Got 24 pixels: 8 differ, mse 1/128; 16 of 24; column 5 is 1 pixel away; thirds at 5, 6, 7: 1/3 + 1/6.
        likeness(measures.get(0).get("got"), 10 * Math.log10(128), 0.015625, 2 / 3.0, 1, 1 / 3.0, 0.5);
        double structure = measures.get(0).get("got").get("structure").doubleValue();
        assertTrue(structure > measures.get(0).get("original").get("structure").doubleValue() && structure < 1);
        // Weights 1 in columns 4 and 5, 1/2 in 3 and 6, all 16 rows: 48 in all. Of the original 16 pixels of weight 1 differ by 1/2.
        assertEquals(8 / 48.0, measures.get(1).get("original").get("meanAbsolute").doubleValue(), 1e-6);
        assertEquals(4 / 48.0, measures.get(1).get("got").get("meanAbsolute").doubleValue(), 1e-6);
        for (int n = 2; n <= 3; n++) {
            for (String picture : new String[] {"got", "original"}) {
                JsonNode equal = measures.get(n).get(picture);
                assertEquals(0, equal.get("meanAbsolute").doubleValue(), 1e-7, n + " " + picture);
            }
        }
        // The hold is empty in every picture: nothing differs, so the ratio is infinite, which JSON writes null.
        JsonNode held = measures.get(2).get("got");
        assertTrue(held.get("peakSignalToNoise").isNull());
        assertEquals(1, held.get("overlap").doubleValue());
        assertEquals(0, held.get("farthest").doubleValue() + held.get("across").doubleValue() + held.get("down").doubleValue());
    }

    /** Distances in pixels here, in heights of 16 pixels there; nothing moves up or down. */
    private static void likeness(JsonNode got, double ratio, double error, double overlap, double farthest, double nearest, double across) {
        assertEquals(ratio, got.get("peakSignalToNoise").doubleValue(), 1e-4);
        assertEquals(error, got.get("meanAbsolute").doubleValue(), 1e-6);
        assertEquals(overlap, got.get("overlap").doubleValue(), 1e-12);
        assertEquals(farthest / 16, got.get("farthest").doubleValue(), 1e-12);
        assertEquals(nearest / 16, got.get("nearest").doubleValue(), 1e-12);
        assertEquals(across / 16, got.get("across").doubleValue(), 1e-6);
        assertEquals(0, got.get("down").doubleValue(), 1e-6);
    }

    /** A block of 32 pixels of 1/2 comes: 16/256; 8 of them go in take 1: 4/256, which take 0 does not do. */
    @Test
    void frameByFrame() throws IOException {
        JsonNode view = compared().get("continuity").get(0);
        assertEquals("front", view.get("view").textValue());
        assertEquals(16, view.get("raster").get(1).intValue());
        double[][] expected = {{1, 0, 0, 0, 0}, {2, 0.0625, 0.0625, 0, 0}, {3, 0, 0.015625, 0.015625, 0.015625}, {4, 0, 0, 0, 0.015625}};
        String[] keys = {"frame", "before", "after", "added", "fromOriginal"};
        assertEquals(4, view.get("frames").size());
        for (int n = 0; n < 4; n++) {
            for (int k = 0; k < 5; k++) {
                assertEquals(expected[n][k], view.get("frames").get(n).get(keys[k]).doubleValue(), 1e-6, "frame " + (n + 1) + " "
                        + keys[k]);
            }
        }
    }

    /** The same figures for people, on standard output and in measures.csv. */
    @Test
    void tableAndFile() throws IOException {
        Path out = place.resolve("review");
        Run run = Run.of("compare", folder.toString(), "--takes", "0,1", "--out", out.toString());
        assertEquals(0, run.code(), run.err());
        assertTrue(run.out().contains("narrow  frame"), run.out());
        assertTrue(run.out().contains("18.1 > 21.1") && run.out().contains("0.500 > 0.667"), run.out());
        // 16/256 and 20/256 over three steps.
        assertTrue(run.out().contains("View front, frame to frame: mean change 0.02083 before, 0.02604 after; most added 0.0156"),
                run.out());
        assertTrue(run.out().contains("farthest from the original 0.0156") && run.out().strip().endsWith(" at frame 3."), run.out());
        List<String> lines = Files.readAllLines(out.resolve("measures.csv"));
        assertEquals("note,region,picture,structure,peakSignalToNoise,meanAbsolute,overlap,farthest,nearest,across,down", lines.get(0));
        assertEquals(1 + 2 * 4, lines.size());
        String[] got = lines.get(1).split(",");
        assertEquals("narrow frame got", got[0] + " " + got[1] + " " + got[2]);
        assertEquals(2 / 3.0, Double.parseDouble(got[6]), 1e-12);
        assertTrue(lines.get(5).startsWith("narrow,hold 1,got,1.0,inf,0.0,1.0,0.0,0.0,0.0,0.0"), lines.get(5));
    }
}
