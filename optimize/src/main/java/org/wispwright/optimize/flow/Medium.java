package org.wispwright.optimize.flow;

import org.wispwright.render.volume.MacVelocity;

/** What the smoke moves through: how values are carried and a velocity made free of divergence, each with its pullback. */
interface Medium {
    /** Readies everything for a substep; the other methods speak of the substep readied last. */
    void ready(Substep at);

    /** Overwrites out with a velocity carried, see {@link Carry#forward}. */
    void carryFaces(MacVelocity u, Displacement d, MacVelocity out);

    /** Pullback of carryFaces, see {@link Carry#pullback}; outBar may be overwritten. */
    void carryFacesBack(MacVelocity u, Displacement d, int reach, MacVelocity outBar, MacVelocity uBar, Displacement dBar);

    /** Overwrites out with values of cells carried. */
    void carryCells(float[] q, Displacement d, float[] out);

    /** Pullback of carryCells; outBar may be overwritten. */
    void carryCellsBack(float[] q, Displacement d, int reach, float[] outBar, float[] qBar, Displacement dBar);

    /** Makes a velocity free of divergence, in place. */
    void project(MacVelocity u);

    /** Pullback of project, in place. */
    void projectBack(MacVelocity uBar);

    /** Overwrites values of solid cells, if there are any, with 0; its own pullback. */
    void clearSolids(float[] cells);

    /** Largest |div u| h / |u| outside solids. */
    double relativeDivergence(MacVelocity u);
}
