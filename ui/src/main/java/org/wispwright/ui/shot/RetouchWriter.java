package org.wispwright.ui.shot;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.fasterxml.jackson.databind.node.TextNode;
import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.Repaint;
import org.wispwright.warp.retouch.Stroke;
import org.wispwright.warp.retouch.WarpKind;

/** Operations, notes and holds as {@link RetouchReader} and {@link NoteReader} read them: the same values, to the bit. */
final class RetouchWriter {
    private RetouchWriter() {
    }

    /** A whole note. */
    static ObjectNode note(Note note, boolean on) {
        ObjectNode object = JsonNodeFactory.instance.objectNode().put("wispwright", SetupReader.FORMAT);
        if (!on) {
            object.put("on", false);
        }
        object.put("words", note.words()).put("frame", note.frame()).put("view", note.view()).put("weight", note.weight());
        object.set("retouch", operations(note));
        note.weighBy().ifPresent(matte -> object.set("weighBy", MatteWriter.matte(matte)));
        note.loss().ifPresent(loss -> {
            ArrayNode kinds = object.putArray("loss");
            loss.kinds().forEach(kind -> kinds.add(JsonPlace.word(kind)));
        });
        if (!note.holds().isEmpty()) {
            object.set("holds", holds(note));
        }
        return object;
    }

    /**
     * A note's text with what differs between two states of the note written anew; every other character stays, unless a key goes.
     *
     * @param text what is on disk
     */
    static String changed(String text, NoteEdits.Listed before, NoteEdits.Listed after) {
        Note was = before.note();
        Note note = after.note();
        if (!was.weighBy().equals(note.weighBy()) || !was.loss().equals(note.loss()) || note.holds().isEmpty() && !was.holds().isEmpty()) {
            return NoteText.of(note(note, after.on()));
        }
        String now = text;
        if (before.on() != after.on()) {
            now = NoteText.with(now, "on", String.valueOf(after.on()));
        }
        if (!was.words().equals(note.words())) {
            now = NoteText.with(now, "words", new TextNode(note.words()).toString());
        }
        if (was.frame() != note.frame()) {
            now = NoteText.with(now, "frame", String.valueOf(note.frame()));
        }
        if (!was.view().equals(note.view())) {
            now = NoteText.with(now, "view", new TextNode(note.view()).toString());
        }
        if (was.weight() != note.weight()) {
            now = NoteText.with(now, "weight", String.valueOf(note.weight()));
        }
        if (!was.retouch().equals(note.retouch())) {
            now = NoteText.with(now, "retouch", NoteText.value(operations(note)));
        }
        if (!was.holds().equals(note.holds())) {
            now = NoteText.with(now, "holds", NoteText.value(holds(note)));
        }
        return now;
    }

    private static ArrayNode operations(Note note) {
        ArrayNode retouch = JsonNodeFactory.instance.arrayNode();
        note.retouch().operations().forEach(operation -> retouch.add(operation(operation)));
        return retouch;
    }

    private static ArrayNode holds(Note note) {
        ArrayNode holds = JsonNodeFactory.instance.arrayNode();
        note.holds().forEach(hold -> holds.add(hold(hold, note.frame())));
        return holds;
    }

    private static ObjectNode hold(Hold hold, int noteFrame) {
        ObjectNode object = JsonNodeFactory.instance.objectNode();
        hold.region().ifPresent(region -> object.set("region", MatteWriter.matte(region)));
        hold.view().ifPresent(view -> object.put("view", view));
        if (!hold.isOf(noteFrame) || hold.spans().size() > 1) {
            ArrayNode frames = object.putArray("frames");
            hold.spans().forEach(span -> frames.addArray().add(span.first()).add(span.last()));
        }
        if (hold.held() != SolveProblem.Held.PICTURE) {
            object.put("held", JsonPlace.word(hold.held()));
        }
        if (hold.weight() != 1) {
            object.put("weight", hold.weight());
        }
        return object;
    }

    /** One entry of a note's list. @throws IllegalArgumentException if there is no way to write this kind */
    static ObjectNode operation(Operation operation) {
        ObjectNode entry = JsonNodeFactory.instance.objectNode();
        ObjectNode object;
        if (operation instanceof Stroke stroke) {
            object = entry.putObject("stroke").put("brush", JsonPlace.word(stroke.brush()));
            MatteWriter.sweep(stroke.sweep(), object);
        } else if (operation instanceof MeshWarp warp) {
            object = entry.putObject("meshWarp");
            if (warp.kind() != WarpKind.SPLINE) {
                object.put("kind", JsonPlace.word(warp.kind()));
            }
            ArrayNode handles = object.putArray("handles");
            warp.handles().forEach(handle -> handles.add(handle(handle)));
            if (warp.kind() == WarpKind.AS_RIGID_AS_POSSIBLE) {
                object.putArray("cells").add(warp.cells().columns()).add(warp.cells().rows());
            }
        } else if (operation instanceof OutlineWarp outline) {
            object = entry.putObject("outline").put("level", outline.level());
            ArrayNode drags = object.putArray("drags");
            outline.drags().forEach(drag -> drags.add(fromTo(drag)));
            object.put("reach", outline.reach()).put("inside", JsonPlace.word(outline.inside()));
        } else if (operation instanceof Repaint repaint && repaint.file().isPresent()) {
            object = entry.putObject("paintOver").put("layers", repaint.file().get());
        } else {
            throw new IllegalArgumentException("retouch: got a " + operation.getClass().getSimpleName() + ", which cannot be written");
        }
        operation.within().ifPresent(matte -> object.set("within", MatteWriter.matte(matte)));
        return entry;
    }

    private static ObjectNode handle(Handle handle) {
        if (handle.from().equals(handle.to())) {
            ObjectNode pin = JsonNodeFactory.instance.objectNode();
            pin.set("pin", MatteWriter.point(handle.from()));
            return pin;
        }
        return fromTo(handle);
    }

    private static ObjectNode fromTo(Handle handle) {
        ObjectNode object = JsonNodeFactory.instance.objectNode();
        object.set("from", MatteWriter.point(handle.from()));
        object.set("to", MatteWriter.point(handle.to()));
        return object;
    }
}
