package org.wispwright.ui.shot;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Pressure;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Cells;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.Stroke;
import org.wispwright.warp.retouch.WarpKind;

/** The words that a note may name a brush with. */
class NoteReaderTest {
    @TempDir
    private Path folder;
    private final Findings findings = new Findings();

    @ParameterizedTest
    @CsvSource({"add,ADD", "remove,REMOVE", "soften,SOFTEN", "restore,RESTORE", "push,PUSH", "even,EVEN", "lift,LIFT"})
    void aBrushByItsWord(String word, Brush brush) throws IOException {
        List<Note> notes = read(word);
        assertEquals(List.of(), findings.all());
        assertEquals(new Stroke(brush, 0.1, 1, 0.5, List.of(new Point(0.3, 0.8), new Point(0.4, 0.7)), Optional.empty()),
                notes.get(0).retouch().operations().get(0));
    }

    @Test
    void anUnknownBrushIsToldTheWords() throws IOException {
        assertEquals(List.of(), read("smudge"));
        String said = findings.all().get(0).toString();
        assertTrue(said.contains("/retouch/0/stroke/brush") && said.contains("\"smudge\""), said);
        for (Brush brush : Brush.values()) {
            assertTrue(said.contains("\"" + JsonPlace.word(brush) + "\""), said);
        }
    }

    /** The kinds by their words, what is left out, and a grid over its region's box: 1 x 1 cells are 4 corners. */
    @ParameterizedTest
    @CsvSource({"spline,SPLINE", "affine,AFFINE", "similarity,SIMILARITY", "rigid,RIGID", "as rigid as possible,AS_RIGID_AS_POSSIBLE"})
    void aWarpByTheWordOfItsKind(String word, WarpKind kind) throws IOException {
        Region region = new Region.Rectangle(0.2, 0.3, 0.6, 0.9, 0);
        List<Handle> corners = List.of(new Handle(new Point(0.2, 0.3), new Point(0.25, 0.35)), Handle.pin(new Point(0.6, 0.3)),
                Handle.pin(new Point(0.2, 0.9)), Handle.pin(new Point(0.6, 0.9)));
        assertEquals(new MeshWarp(kind, corners, Cells.USUAL, Optional.of(region)), operation("""
                {"meshWarp": {"kind": "%s", "grid": {"columns": 1, "rows": 1, "moved": [{"corner": [0, 0], "to": [0.25, 0.35]}]},
                 "within": {"rectangle": {"left": 0.2, "top": 0.3, "right": 0.6, "bottom": 0.9}, "feather": 0}}}""".formatted(word)));
        Handle drag = new Handle(new Point(0.3, 0.4), new Point(0.2, 0.4));
        assertEquals(new OutlineWarp(0.25, List.of(drag), 0.15, kind, Optional.empty()), operation("""
                {"outline": {"inside": "%s", "drags": [{"from": [0.3, 0.4], "to": [0.2, 0.4]}]}}""".formatted(word)));
    }

    @Test
    void cellsAndABoxOfItsOwn() throws IOException {
        MeshWarp warp = (MeshWarp) operation("""
                {"meshWarp": {"kind": "as rigid as possible", "cells": [12, 9],
                 "grid": {"columns": 2, "rows": 1, "box": {"left": 0, "top": 0.5, "right": 1, "bottom": 1},
                          "moved": [{"corner": [1, 0], "to": [0.5, 0.4]}]}}}""");
        assertEquals(new Cells(12, 9), warp.cells());
        assertEquals(new Handle(new Point(0.5, 0.5), new Point(0.5, 0.4)), warp.handles().get(1));
        // The spline is what a warp is that names no kind.
        assertEquals(WarpKind.SPLINE, ((MeshWarp) operation("""
                {"meshWarp": {"handles": [{"pin": [0, 0]}, {"pin": [0, 1]}, {"from": [0.5, 0.5], "to": [0.6, 0.5]}]}}""")).kind());
    }

    private Operation operation(String text) throws IOException {
        Files.createDirectories(folder.resolve("notes"));
        Files.writeString(folder.resolve("shot.json"), "{}");
        Files.writeString(folder.resolve("notes/a.json"), """
                {"wispwright": 1, "words": "As drawn.", "frame": 3, "view": "front", "retouch": [%s]}
                """.formatted(text));
        List<Note> notes = new NoteReader(ShotFolder.open(folder), new MattePictures(ShotFolder.open(folder), 1L << 30),
                findings).read().on();
        assertEquals(List.of(), findings.all());
        return notes.get(0).retouch().operations().get(0);
    }

    @Test
    void pressureAndSpacing() throws IOException {
        List<Point> line = List.of(new Point(0.3, 0.8), new Point(0.4, 0.7));
        for (Pressure.On on : Pressure.On.values()) {
            String word = ", \"pressureOn\": \"" + JsonPlace.word(on) + "\"";
            assertStroke(new Sweep(0.1, 1, 0.5, line, new Pressure(on, List.of(0.25, 1.0)), 0.75),
                    ", \"pressure\": [0.25, 1], \"spacing\": 0.75" + word);
        }
        assertStroke(new Sweep(0.1, 1, 0.5, line, new Pressure(Pressure.On.STRENGTH, List.of(0.25, 1.0)), 0), ", \"pressure\": [0.25, 1]");
    }

    private void assertStroke(Sweep sweep, String more) throws IOException {
        List<Note> notes = read("add", more);
        assertEquals(List.of(), findings.all());
        assertEquals(new Stroke(Brush.ADD, sweep, Optional.empty()), notes.get(0).retouch().operations().get(0));
    }

    private List<Note> read(String brush) throws IOException {
        return read(brush, "");
    }

    private List<Note> read(String brush, String more) throws IOException {
        Files.createDirectories(folder.resolve("notes"));
        Files.writeString(folder.resolve("shot.json"), "{}");
        Files.writeString(folder.resolve("notes/a.json"), """
                {"wispwright": 1, "words": "As drawn.", "frame": 3, "view": "front",
                 "retouch": [{"stroke": {"brush": "%s", "radius": 0.1, "line": [[0.3, 0.8], [0.4, 0.7]]%s}}]}
                """.formatted(brush, more));
        ShotFolder shot = ShotFolder.open(folder);
        return new NoteReader(shot, new MattePictures(shot, 1L << 30), findings).read().on();
    }
}
