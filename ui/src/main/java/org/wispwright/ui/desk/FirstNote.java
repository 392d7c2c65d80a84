package org.wispwright.ui.desk;

import java.util.Optional;
import java.util.Set;

/** The steps from a shot to a first note that is met: what the guide leads through. Each knows by itself whether it is done. */
public enum FirstNote {
    /** The easel is at a note. */ NOTE,
    /** The note has a retouch. */ RETOUCH,
    /** Something of it must stay. Not every note needs it. */ HOLD,
    /** There is a take that was solved. */ SOLVE,
    /** Two pictures are set against each other. */ COMPARE;

    /** True if it is done. */
    public boolean isDone(DeskState state) {
        boolean solved = state.takes().stream().anyMatch(take -> take.number() > 0);
        return switch (this) {
            case NOTE -> state.openNote().isPresent();
            case RETOUCH -> state.openNote().map(l -> !l.note().retouch().operations().isEmpty()).orElse(false);
            case HOLD -> state.openNote().map(l -> !l.note().holds().isEmpty()).orElse(false);
            case SOLVE -> solved;
            case COMPARE -> solved && state.showing().map(s -> s.against() != Against.ALONE).orElse(false);
        };
    }

    /** The first step that is neither done nor passed over; empty when all are, or without a shot. */
    public static Optional<FirstNote> next(DeskState state, Set<FirstNote> passed) {
        if (state.shot().isEmpty()) {
            return Optional.empty();
        }
        for (FirstNote step : values()) {
            if (!step.isDone(state) && !passed.contains(step)) {
                return Optional.of(step);
            }
        }
        return Optional.empty();
    }
}
