package org.wispwright.warp.loss;

import java.util.List;
import java.util.stream.Collectors;
import org.wispwright.render.picture.Picture;

/**
 * Which losses a note is solved with, and why. Each kind is divided by its value for the original and they share alike, so a note's loss
 * {@code (1 / n) sum_k J_k(got) / J_k(original)} starts at 1; all are 0 at the wanted picture.
 *
 * @param kinds one or more, none twice
 * @param why   half a sentence for a person
 */
public record LossChoice(List<LossKind> kinds, String why) {
    /** A loss whose value for the original is not above this sees nothing of a retouch. */
    public static final double LEAST_START = 1e-9;

    private static final double LEAST_BALANCE = 0.5;
    private static final double MOST_INSIDE = 0.5;
    private static final double LEAST_LEAD = 0.5;

    /** Copies the list. @throws IllegalArgumentException if it is empty or names a kind twice */
    public LossChoice {
        kinds = List.copyOf(kinds);
        if (kinds.isEmpty() || kinds.stream().distinct().count() < kinds.size()) {
            throw new IllegalArgumentException("losses of a note: got " + kinds + ", needs one or more, none twice");
        }
    }

    /**
     * The program's choice for a retouch, by {@link RetouchMeasure}: {@code pyramid+transport} where smoke moves (balance at least
     * {@value #LEAST_BALANCE}), outlines and all (inside below {@value #MOST_INSIDE}), to where the pyramid loss does not see it
     * (lead below {@value #LEAST_LEAD}); else the pyramid loss alone.
     *
     * @throws IllegalArgumentException if the rasters differ
     */
    public static LossChoice of(Picture original, Picture wanted) {
        RetouchMeasure measure = RetouchMeasure.of(original, wanted);
        if (measure.balance() < LEAST_BALANCE) {
            return new LossChoice(List.of(LossKind.PYRAMID), "smoke comes or goes more than it moves");
        }
        if (measure.inside() >= MOST_INSIDE) {
            return new LossChoice(List.of(LossKind.PYRAMID), "the inside of the smoke changes more than its outline");
        }
        if (measure.lead() >= LEAST_LEAD) {
            return new LossChoice(List.of(LossKind.PYRAMID), "smoke moves no farther than the pyramid loss sees");
        }
        return new LossChoice(List.of(LossKind.PYRAMID, LossKind.TRANSPORT), "smoke moves farther than the pyramid loss sees");
    }

    /** Its part of the note's loss at the start: 0 for a kind that is not chosen. */
    public double share(LossKind kind) {
        return kinds.contains(kind) ? 1.0 / kinds.size() : 0;
    }

    /**
     * How far a note's loss has fallen: {@code 1 - (1 / n) sum_k J_k(got) / J_k(original)}.
     *
     * @param weights one number a pixel, finite, 0 or more
     * @throws IllegalArgumentException if rasters or counts differ, or a kind sees no difference of original and wanted
     */
    public double fall(Picture original, Picture wanted, float[] weights, Picture got) {
        double left = 0;
        for (LossKind kind : kinds) {
            PictureLoss loss = kind.of(original, wanted, weights);
            double start = loss.value(original);
            if (!(start > LEAST_START)) {
                throw new IllegalArgumentException("its loss '" + kind.word() + "' sees nothing of its retouch (" + start
                        + " for the original); name another, or leave the choice to the program");
            }
            left += share(kind) * loss.value(got) / start;
        }
        return 1 - left;
    }

    /** As notes name it: {@code pyramid+transport}. */
    public String inWords() {
        return kinds.stream().map(LossKind::word).collect(Collectors.joining("+"));
    }
}
