package org.wispwright.optimize.solve;

import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Comparator;
import java.util.stream.IntStream;
import org.wispwright.optimize.checkpoint.Budget;
import org.wispwright.optimize.checkpoint.Reversal;
import org.wispwright.optimize.checkpoint.ReversibleChain;
import org.wispwright.optimize.checkpoint.SlotFile;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeState;

/**
 * The states that a sweep keeps, in numbered slots. Slot 0 is the start, which a sweep always begins with and nobody changes: it is kept
 * as it is given. Of the others, those that the sweep goes to least often are on disk: it is gone through once without a chain, and counted.
 * With few of them these are the earliest states, since a reversal opens its parts one inside the other and is at work in the last one
 * (6 slots for 29 steps: 3, 5, 7, 9, 11, 13 times). Slots in memory are made when first written.
 */
final class Snapshots {
    private final SmokeState start;
    private final FlowSetup flow;
    private final int count;
    private final Path place;
    /** For each slot its place in the file; -1 in memory. */
    private final int[] placeOnDisk;
    private final SmokeState[] held;
    private SlotFile file;

    /**
     * As many as are of use and fit.
     *
     * @param start kept and read: the state of the first frame; must not change
     * @param steps of the sweep, 1 or more
     * @throws IllegalArgumentException if not one state fits into the memory
     */
    Snapshots(FlowSetup flow, SmokeState start, int steps, StateRoom room) {
        Budget budget = new Budget(room.memoryBytes(), room.diskBytes(), SmokeState.bytes(flow));
        this.start = start;
        this.flow = flow;
        count = budget.snapshots(steps);
        placeOnDisk = placesOnDisk(uses(steps, count), budget.onDisk(steps));
        place = room.file();
        held = new SmokeState[count];
    }

    /** How many there are, the start among them. */
    int count() {
        return count;
    }

    /** How many of them are on disk. */
    int onDisk() {
        return (int) Arrays.stream(placeOnDisk).filter(at -> at >= 0).count();
    }

    /** The state of the first frame, to read. */
    SmokeState start() {
        return start;
    }

    /** Copies a state into a slot; for slot 0 it is the start. @throws UncheckedIOException if the disk refuses */
    void save(int slot, SmokeState state) {
        if (placeOnDisk[slot] >= 0) {
            if (file == null) {
                file = new SlotFile(place, SmokeState.bytes(flow) / Float.BYTES);
            }
            file.save(placeOnDisk[slot], state.arrays());
        } else if (slot > 0) {
            if (held[slot] == null) {
                held[slot] = SmokeState.of(flow);
            }
            held[slot].set(state);
        }
    }

    /** Overwrites a state with what a slot holds. @throws UncheckedIOException if the disk refuses */
    void restore(int slot, SmokeState out) {
        if (placeOnDisk[slot] >= 0) {
            file.restore(placeOnDisk[slot], out.arrays());
        } else {
            out.set(slot == 0 ? start : held[slot]);
        }
    }

    /** Lets go of all but the start, and of the file; a sweep after this makes new ones. */
    void release() {
        Arrays.fill(held, null);
        if (file != null) {
            file.close();
            file = null;
        }
    }

    /** Puts so many of the slots but 0 on disk, the least used first, of equals the lowest. */
    static int[] placesOnDisk(int[] uses, int onDisk) {
        int[] places = new int[uses.length];
        Arrays.fill(places, -1);
        int[] least = IntStream.range(1, uses.length).boxed().sorted(Comparator.comparingInt(slot -> uses[slot])).limit(onDisk)
                .mapToInt(Integer::intValue).toArray();
        for (int n = 0; n < least.length; n++) {
            places[least[n]] = n;
        }
        return places;
    }

    /** How often a gradient of so many steps writes and reads each slot. */
    static int[] uses(int steps, int slots) {
        int[] uses = new int[slots];
        Reversal.run(new ReversibleChain() {
            @Override
            public void save(int slot) {
                uses[slot]++;
            }

            @Override
            public void restore(int slot) {
                uses[slot]++;
            }

            @Override
            public void advance(int step) {
            }

            @Override
            public void tape(int step) {
            }

            @Override
            public void pull(int step) {
            }
        }, steps, slots);
        return uses;
    }
}
