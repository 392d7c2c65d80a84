package org.wispwright.ui.shot;

import java.util.List;
import java.util.Optional;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.render.march.Look;
import org.wispwright.render.picture.Rgb;

/**
 * What a shot folder says: the simulation's set-up, look, views and notes. The takes stay on disk.
 *
 * @param name for people
 * @param flow what is simulated
 * @param look how density becomes a picture
 * @param background linear light; behind the smoke when a picture is shown, never inside a solve
 * @param views at least one, names differ
 * @param notes that take part, in the order of their ids
 * @param off notes that are off: checked like the others, but no part of a solve or a comparison
 * @param holds what must stay whatever the notes want; each names its view
 */
public record Shot(String name, FlowSetup flow, Look look, Rgb background, List<ShotView> views, List<Note> notes,
        List<Note> off, List<Hold> holds) {
    /** Keeps copies. */
    public Shot {
        views = List.copyOf(views);
        notes = List.copyOf(notes);
        off = List.copyOf(off);
        holds = List.copyOf(holds);
    }

    /** The same shot with another flow: its substeps found. */
    public Shot withFlow(FlowSetup other) {
        return new Shot(name, other, look, background, views, notes, off, holds);
    }

    /** The view of that name. */
    public Optional<ShotView> view(String wanted) {
        return views.stream().filter(v -> v.view().name().equals(wanted)).findFirst();
    }
}
