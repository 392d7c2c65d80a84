package org.wispwright.ui.desk;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.Stream;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.TakeRecord;
import org.wispwright.ui.shot.Takes;

/** What is read of a shot folder before it lies on the desk. */
record Opening(OpenShot shot, List<TakeEntry> takes) {
    /** Reads a folder. @throws ShotException with the first thing that is wrong with it */
    static Opening read(Path folder) {
        ShotFolder opened = ShotFolder.open(folder);
        Shot setup = ShotCheck.requireForNotes(opened);
        OpenShot shot = new OpenShot(opened, setup, NoteEdits.of(opened).list());
        return new Opening(shot, takes(shot));
    }

    /** The desk with the shot on it: its first note open, its newest take shown. */
    DeskState onto(Hand hand, TakeWork work) {
        Optional<Listed> first = shot.notes().stream().findFirst();
        String view = first.map(l -> l.note().view()).orElse(shot.setup().views().get(0).view().name());
        int frame = first.map(l -> l.note().frame()).orElse(shot.setup().flow().frames().last());
        int newest = takes.stream().filter(TakeEntry::current).mapToInt(TakeEntry::number).max().orElse(0);
        Showing showing = Showing.of(view, frame).withNear(new Source.Take(newest));
        return new DeskState(Optional.of(shot), Optional.of(showing), first.map(l -> l.note().id()), hand, takes, History.NONE,
                Saving.DONE, Optional.empty(), work.onAnotherShot());
    }

    /** The takes that are there; one that cannot be read is left out. */
    static List<TakeEntry> takes(OpenShot shot) {
        Takes takes = Takes.of(shot.folder());
        List<TakeEntry> entries = new ArrayList<>();
        for (int number : takes.numbers()) {
            try {
                entries.add(entry(shot, number, takes.record(number)));
            } catch (ShotException | IOException damaged) {
                continue;                                                      // 'check' and opening it say what is wrong with it
            }
        }
        return entries;
    }

    private static TakeEntry entry(OpenShot shot, int number, TakeRecord record) throws IOException {
        Path folder = shot.folder().inside("takes/" + Takes.name(number));
        Map<String, Double> met = new LinkedHashMap<>();
        for (Map.Entry<String, JsonNode> one : record.figures().path("met").properties()) {
            met.put(one.getKey(), one.getValue().asDouble());
        }
        JsonNode from = record.settings().path("from");
        FileTime made = Files.getLastModifiedTime(folder.resolve("take.json"));
        return new TakeEntry(number, from.isInt() ? OptionalInt.of(from.intValue()) : OptionalInt.empty(), made,
                Optional.ofNullable(record.settings().path("quality").textValue()), met, bytes(folder), record.belongsTo(shot.setup().flow()));
    }

    private static long bytes(Path folder) throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            long sum = 0;
            for (Path file : (Iterable<Path>) files::iterator) {
                sum += Files.size(file);
            }
            return sum;
        }
    }
}
