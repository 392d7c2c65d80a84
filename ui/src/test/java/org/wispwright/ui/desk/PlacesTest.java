package org.wispwright.ui.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.shot.Hold;

/** Where notes and holds lie. Two notes: lean on 1004 with a hold there, open on 1006 with one of 1003 to 1006. Expectations: by hand. */
class PlacesTest {
    @TempDir
    private Path folder;

    @Test
    void fromNoteToNote() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            DeskState s = Places.at(d.desk.state(), "open");
            assertEquals(List.of(1006, "side"), List.of(s.showing().orElseThrow().frame(), s.showing().orElseThrow().view()));
            assertEquals(Optional.of("lean"), Places.beside(s, 1));
            assertEquals(Optional.of("lean"), Places.beside(s.withNote(Optional.empty()), 1));
            assertEquals(Optional.of("open"), Places.beside(s.withNote(Optional.empty()), -1));
            assertEquals(Optional.empty(), Places.nearest(s, true));
            assertEquals(Optional.of("lean"), Places.nearest(s, false));
            assertEquals(Optional.of("open"), Places.nearest(Places.onFrame(s, 1005), true));
            assertEquals(1006, Places.onFrame(s, 2000).showing().orElseThrow().frame());
            assertEquals(1001, Places.onFrame(s, 0).showing().orElseThrow().frame());
            assertEquals(s, Places.at(s, "none"));
        }
    }

    @Test
    void theShownTakeIsJudgedOrElseTheNewest() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            DeskState s = d.desk.state();
            assertEquals(OptionalInt.empty(), Places.judged(s));
            DeskState three = s.withTakes(List.of(take(0, true), take(1, true), take(2, false)));
            assertEquals(OptionalInt.of(1), Places.judged(three.withShowing(s.showing().get().withNear(new Source.Wanted("lean")))));
            assertEquals(OptionalInt.of(1), Places.judged(three.withShowing(s.showing().get().withNear(new Source.Take(2)))));
            assertEquals(OptionalInt.of(0), Places.judged(three.withShowing(s.showing().get().withNear(Source.ORIGINAL))));
        }
    }

    private static TakeEntry take(int number, boolean current) {
        return new TakeEntry(number, OptionalInt.empty(), FileTime.fromMillis(0), Optional.empty(),
                Map.of(), 0, current);
    }

    @Test
    void holdsJoinWhereTheyMeet() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            assertEquals(List.of(new Spans.Held(1003, 1006, 2)), Spans.of(d.shot()));
            d.desk.edit(NoteEdit.holds("Hold", "open", holds -> List.of(new Hold(holds.get(0).region().orElseThrow(), 1001, 1002),
                    new Hold(holds.get(0).region().orElseThrow(), 1006, 1006))));
            assertEquals(List.of(new Spans.Held(1001, 1002, 1), new Spans.Held(1004, 1004, 1), new Spans.Held(1006, 1006, 1)),
                    Spans.of(d.shot()));
            d.desk.edit(NoteEdit.on("Off", "lean", false));
            assertEquals(List.of(new Spans.Held(1001, 1002, 1), new Spans.Held(1006, 1006, 1)), Spans.of(d.shot()));
        }
    }

    @Test
    void framesAlongALine() {
        RangeScale scale = new RangeScale(new FrameRange(1001, 1010, 24), 200);
        assertEquals(List.of(1001, 1001, 1002, 1010, 1010), List.of(scale.frameAt(-5), scale.frameAt(19.9), scale.frameAt(20),
                scale.frameAt(199), scale.frameAt(900)));
        assertEquals(20, scale.left(1002));
        assertEquals(190, scale.middle(1010));
        assertEquals(200, scale.left(1011));
    }
}
