package org.wispwright.optimize.flow;

/** What a side of the box does to the air. */
public enum Side {
    /** Nothing passes: the velocity through the side is 0. */
    WALL,
    /** Air passes freely: the pressure is 0 at the centre of the ghost cell beyond the side. */
    OPEN
}
