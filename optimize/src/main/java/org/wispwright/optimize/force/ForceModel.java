package org.wispwright.optimize.force;

import org.wispwright.render.volume.MacVelocity;

/**
 * Numbers to the force of each step of a frame range, and gradients back to them; linear. The pullback is the transpose of the force:
 * {@code xBar . dx = sum over steps of forceBar . force(dx)}. The solve has {@link ForceBasis}; others are there to be measured against it.
 */
public interface ForceModel {
    /** Number of unknowns when all are in play; a model may take fewer, and says which counts it takes. */
    int unknowns();

    /**
     * Overwrites the force of a step.
     *
     * @param x    read: unknowns
     * @param step 0 for the step that leads to the range's second frame
     * @param out  overwritten, m/s2 on faces
     * @throws IllegalArgumentException if x has not a length that the model takes
     */
    void force(double[] x, int step, MacVelocity out);

    /**
     * Adds to xBar what a derivative by the force of a step asks of the unknowns.
     *
     * @param forceBar read
     * @param step     as above
     * @param xBar     added to, as long as x
     * @throws IllegalArgumentException if xBar has not a length that the model takes
     */
    void pullback(MacVelocity forceBar, int step, double[] xBar);
}
