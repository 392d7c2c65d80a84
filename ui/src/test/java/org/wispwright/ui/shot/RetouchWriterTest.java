package org.wispwright.ui.shot;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.warp.loss.LossChoice;
import org.wispwright.warp.loss.LossKind;
import org.wispwright.warp.matte.BrushedMatte;
import org.wispwright.warp.matte.CombinedMatte;
import org.wispwright.warp.matte.DensityRange;
import org.wispwright.warp.matte.ImageMatte;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Cells;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.Repaint;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Stroke;
import org.wispwright.warp.retouch.WarpKind;

/** What is written is what the document says of a note; read again it is the same value, to the bit. */
class RetouchWriterTest {
    private static final List<Matte> MATTES = List.of(new Region.Rectangle(0.1, 1 / 3.0, 0.2, Math.PI, 1e-17),
            new Region.Ellipse(new Point(-0.1, 1e-9), 0.1, 0.7, 0.02),
            new Region.Polygon(List.of(new Point(0, 0), new Point(0.3, 0), new Point(0.1, 2 / 7.0)), 0),
            new DensityRange(0.1, 1 / 3.0, 0.07, 0.01),
            new BrushedMatte(List.of(new BrushedMatte.Dab(BrushedMatte.Way.ADD, new Sweep(0.1, 0.3, 1, List.of(new Point(0, 0.1)))),
                    new BrushedMatte.Dab(BrushedMatte.Way.TAKE, new Sweep(0.2, 1, 0, List.of(new Point(0, 0.1), new Point(1, 1 / 9.0)))))),
            new CombinedMatte(CombinedMatte.Way.SUBTRACT, List.of(new DensityRange(0, 0.5, 0.1, 0),
                    new CombinedMatte(CombinedMatte.Way.INVERSE, List.of(new Region.Rectangle(0, 0, 1, 1, 0))))));

    @TempDir
    private Path folder;

    /** A kind that joins must be writable. */
    @Test
    void everyPermittedKindComesBack() {
        List<Operation> operations = new ArrayList<>();
        for (Brush brush : Brush.values()) {
            operations.add(new Stroke(brush, 0.1, 1 / 3.0, 0, List.of(new Point(0.1, 0.7)), Optional.empty()));
        }
        for (Matte matte : MATTES) {
            operations.add(new Stroke(Brush.ADD, 0.05, 1, 1, List.of(new Point(0.1, 0.7), new Point(0, -1)), Optional.of(matte)));
            operations.add(new MeshWarp(List.of(new Handle(new Point(0, 0.1), new Point(0.2, 0.3)), Handle.pin(new Point(0.5, 0.1)),
                    Handle.pin(new Point(0.3, 1))), Optional.of(matte)));
        }
        for (WarpKind kind : WarpKind.values()) {
            operations.add(new MeshWarp(kind, List.of(new Handle(new Point(0, 0.1), new Point(0.2, 0.3)), Handle.pin(new Point(0.5, 0.1)),
                    Handle.pin(new Point(0.3, 1))), kind == WarpKind.AS_RIGID_AS_POSSIBLE ? new Cells(7, 9) : Cells.USUAL,
                    Optional.empty()));
            operations.add(new OutlineWarp(0.3, List.of(new Handle(new Point(0.1, 0.2), new Point(0.3, 0.1)), Handle.pin(new Point(0.4,
                    0.2))),
                    1 / 7.0, kind, Optional.of(MATTES.get(0))));
        }
        // Pixels are looked at below.
        Set<Class<?>> kinds = operations.stream().map(Object::getClass).collect(Collectors.toSet());
        kinds.add(Repaint.class);
        assertEquals(Set.of(Operation.class.getPermittedSubclasses()), kinds);
        Set<Class<?>> mattes = MATTES.stream().map(m -> m instanceof Region ? Region.class : m.getClass()).collect(Collectors.toSet());
        mattes.add(ImageMatte.class);
        assertEquals(Set.of(Matte.class.getPermittedSubclasses()), mattes);
        assertEquals(Set.of(Region.class.getPermittedSubclasses()),
                MATTES.stream().filter(Region.class::isInstance).map(Object::getClass).collect(Collectors.toSet()));
        List<Hold> holds = List.of(new Hold(MATTES.get(0), 7, 7), new Hold(MATTES.get(1), 3, 9),
                new Hold(Optional.empty(), Optional.of("side"), List.of(new SolveProblem.Span(1, 2), new SolveProblem.Span(5, 9)),
                        SolveProblem.Held.SILHOUETTE, 2.5));
        Note note = new Note("odd", "A \"quote\",\n\u00e9 and \uD83D\uDCA8", 7, "front", 0.1, Optional.of(MATTES.get(4)),
                new Retouch(operations), holds, Optional.of(new LossChoice(List.of(LossKind.EDGES, LossKind.PYRAMID), "as the note says")));
        for (boolean on : new boolean[] {true, false}) {
            String text = NoteText.of(RetouchWriter.note(note, on));
            JsonPlace top = JsonDoor.parse("odd.json", text.getBytes(StandardCharsets.UTF_8));
            assertEquals(note, NoteReader.note(top, "odd.json", null));
            assertEquals(on, NoteReader.isOn(top));
            assertEquals(on, !text.contains("\"on\""));
        }
    }

    /** Image mattes and paint-overs are written by their files' names. */
    @Test
    void pixelsComeBackByTheirFiles() throws IOException {
        Files.createDirectories(folder.resolve("notes"));
        Files.writeString(folder.resolve("shot.json"), "{}");
        ImageIO.write(new BufferedImage(4, 3, BufferedImage.TYPE_BYTE_GRAY), "png", folder.resolve("matte.png").toFile());
        ShotFolder shot = ShotFolder.open(folder);
        String layers = PaintFile.write(shot, "odd", new Repaint(2, 1, new float[] {0.5f, 0, 0.1f, 1, 0, 0, 0, 0}));
        String text = """
                {"wispwright": 1, "words": "w", "frame": 3, "view": "front", "weight": 1.0, "retouch": [{"paintOver": {"layers": "%s"}},
                 {"stroke": {"brush": "add", "radius": 0.1, "line": [[0, 0]],
                  "within": {"image": {"file": "matte.png", "channel": "grey"}, "feather": 0.1}}}]}
                """.formatted(layers);
        Note note = NoteReader.note(JsonDoor.parse("odd.json", text.getBytes(StandardCharsets.UTF_8)).with(new MattePictures(shot,
                1L << 30)),
                "odd.json", shot);
        String written = NoteText.of(RetouchWriter.note(note, true));
        assertTrue(written.contains(layers) && written.contains("matte.png") && written.contains("\"channel\":\"grey\""), written);
        Note again = NoteReader.note(JsonDoor.parse("odd.json", written.getBytes(StandardCharsets.UTF_8))
                .with(new MattePictures(shot, 1L << 30)), "odd.json", shot);
        assertEquals(written, NoteText.of(RetouchWriter.note(again, true)));
    }

    @Test
    void theTextOfANote() {
        Note note = new Note("a", "Thin it.", 5, "front", 2, Optional.empty(), new Retouch(List.of(
                new Stroke(Brush.REMOVE, 0.1, 0.5, 0.25, List.of(new Point(0.5, 0.25)), Optional.empty()))), List.of(), Optional.empty());
        assertEquals("""
                {
                  "wispwright": 1,
                  "words": "Thin it.",
                  "frame": 5,
                  "view": "front",
                  "weight": 2.0,
                  "retouch": [
                    {"stroke":{"brush":"remove","radius":0.1,"strength":0.5,"softEdge":0.25,"line":[[0.5,0.25]]}}
                  ]
                }
                """, NoteText.of(RetouchWriter.note(note, true)));
    }

    @Test
    void listsAreSwappedWhole() {
        String text = "\uFEFF{\"a\": 1, \"retouch\": [ {\"x\": [1, \"]\"]} ] , \"holds\":[]}";
        assertEquals("\uFEFF{\"a\": 1, \"retouch\": [2] , \"holds\":[]}", NoteText.with(text, "retouch", "[2]"));
        assertEquals("\uFEFF{\"a\": 1, \"retouch\": [ {\"x\": [1, \"]\"]} ] , \"holds\":[3]}", NoteText.with(text, "holds", "[3]"));
        assertTrue(NoteText.with(text, "retouch", "{}").contains("\"retouch\": {} ,"));
        assertTrue(NoteText.with(text, "a", "[7]").startsWith("\uFEFF{\"a\": [7], \"retouch\": [ {"));
    }
}
