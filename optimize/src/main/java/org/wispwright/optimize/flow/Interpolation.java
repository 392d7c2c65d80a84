package org.wispwright.optimize.flow;

/** How a value between cell centres is made from the cells around it. */
public enum Interpolation {
    /** Trilinear, 8 cells. First order over many steps; it has a kink at every cell border. Staniforth and Cote (1991). */
    LINEAR,
    /** Keys (1981) cubic with a = -1/2, 4 x 4 x 4 cells, clamped to the 8 nearest values so that it makes no new extremes. */
    CUBIC
}
