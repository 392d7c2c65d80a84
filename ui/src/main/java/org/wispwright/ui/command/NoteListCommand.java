package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.job.NoteLosses;
import org.wispwright.ui.job.SmokeAsked;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.warp.loss.LossChoice;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code note list SHOT}. */
@Command(name = "list", sortOptions = false,
        description = "List the notes: id, frame, view, weight, loss, on or off, words. Writes nothing.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note list samples/kiln-yard",
            "  java -jar wispwright.jar note list samples/kiln-yard --json"})
final class NoteListCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Parameters(paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Override
    public Integer call() {
        ShotFolder folder = ShotFolder.open(shot);
        List<NoteEdits.Listed> notes = NoteEdits.of(folder).list();
        Shot checked = ShotCheck.requireForNotes(folder);
        List<String> lines = new ArrayList<>();
        ObjectNode object = Manner.object().put("ok", true);
        ArrayNode array = object.putArray("notes");
        for (NoteEdits.Listed listed : notes) {
            Note note = listed.note();
            String named = note.loss().map(LossChoice::inWords).orElse("auto");
            Optional<LossChoice> loss = NoteLosses.of(folder, checked, note, new Lanes(1));
            lines.add(line(listed,
                    note.loss().isPresent() || loss.isEmpty() ? named : named + " (" + loss.get().inWords() + ")"));
            ObjectNode entry = array.addObject().put("id", note.id()).put("frame", note.frame()).put("view", note.view())
                    .put("weight", note.weight())
                    .put("loss", named).put("on", listed.on()).put("words", note.words());
            SmokeAsked.known(folder, checked, note, new Lanes(1)).ifPresent(smoke -> entry.set("smokeAsked", smoke.json()));
            loss.ifPresent(choice -> entry.put("lossChosen", choice.inWords()).put("lossWhy", choice.why()));
        }
        manner.say(notes.isEmpty() ? "The shot has no note." : String.join(System.lineSeparator(), lines), object);
        return ExitCodes.OK;
    }

    private static String line(NoteEdits.Listed listed, String loss) {
        Note note = listed.note();
        String weight = note.weight() == Math.rint(note.weight()) ? String.valueOf((long) note.weight()) : String.valueOf(note.weight());
        return note.id() + "  frame " + note.frame() + "  view " + note.view() + "  weight " + weight + "  loss " + loss
                + (listed.on() ? "  on   " : "  off  ")
                + note.words().replaceAll("\\s+", " ");
    }
}
