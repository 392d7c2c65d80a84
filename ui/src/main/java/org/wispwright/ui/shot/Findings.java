package org.wispwright.ui.shot;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;

/** Collects what is wrong, so that a person sees all of it at once and not one fault a run. Not for several threads. */
public final class Findings {
    private final List<Finding> all = new ArrayList<>();

    /** Adds one finding. */
    public void add(Finding finding) {
        all.add(finding);
    }

    /** Runs a reading step; if it finds a fault, keeps the finding and gives nothing. */
    public <T> Optional<T> attempt(Supplier<T> step) {
        try {
            return Optional.of(step.get());
        } catch (ShotException fault) {
            all.add(fault.finding());
            return Optional.empty();
        }
    }

    /** Runs a check; if it finds a fault, keeps the finding. */
    public void check(Runnable step) {
        attempt(() -> {
            step.run();
            return Boolean.TRUE;
        });
    }

    /** All findings so far, in the order they were made. */
    public List<Finding> all() {
        return List.copyOf(all);
    }

    /** True if nothing was found. */
    public boolean none() {
        return all.isEmpty();
    }

    /** @throws ShotException carrying the first finding, if there is one */
    public void throwFirst() {
        if (!all.isEmpty()) {
            throw new ShotException(all.get(0));
        }
    }
}
