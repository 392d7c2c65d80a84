package org.wispwright.optimize.flow;

import org.junit.jupiter.api.Nested;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.volume.GridShape;

/** Outside checks O69, O70 with moving solids in the box. Claerbout (1992), Earth Soundings Analysis. */
class SolidPullbackTest {
    private static final GridShape BOX = new GridShape(9, 7, 8, 0.5);
    private static final GridShape PLANE = new GridShape(11, 8, 1, 0.5);
    /** Shorter than half a cell: no path meets a solid, but values around it do. */
    private static final double NEAR = 0.05;
    /** Longer: paths are cut at solids, on faces of every axis. */
    private static final double FAR = 0.6;

    /** From longer steps, for three halvings above the rounding of float; still off every kink. */
    abstract static class Longer extends PullbackContract {
        @Override protected double largestStep() {
            return 2;
        }

        @Override protected double noise() {
            return 5e-7;                                                       // a quotient of two sums of 8, or 64 weights of both signs
        }
    }

    @Nested class ProjectionClosed extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.solidProjection(BOX, Sides.CLOSED);
        }
    }

    @Nested class ProjectionMixed extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.solidProjection(BOX, new Sides(Side.WALL, Side.OPEN, Side.WALL, Side.OPEN, Side.OPEN, Side.WALL));
        }
    }

    @Nested class ProjectionPlane extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.solidProjection(PLANE, new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.OPEN, Side.WALL, Side.WALL));
        }
    }

    @Nested class CellsLinearNear extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.carryAround(BOX, Lattice.Axis.CENTRES, Interpolation.LINEAR, NEAR);
        }
    }

    @Nested class CellsLinearFar extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.carryAround(new GridShape(10, 8, 7, 0.5), Lattice.Axis.CENTRES, Interpolation.LINEAR, FAR);
        }
    }

    @Nested class CellsLinearFarther extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.carryAround(BOX, Lattice.Axis.CENTRES, Interpolation.LINEAR, 1.6);
        }
    }

    @Nested class CellsCubicFar extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.carryAround(new GridShape(13, 9, 8, 0.5), Lattice.Axis.CENTRES, Interpolation.CUBIC, FAR);
        }
    }

    @Nested class XFacesFar extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.carryAround(BOX, Lattice.Axis.X_FACES, Interpolation.LINEAR, FAR);
        }
    }

    @Nested class YFacesFar extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.carryAround(BOX, Lattice.Axis.Y_FACES, Interpolation.LINEAR, FAR);
        }
    }

    @Nested class ZFacesFar extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.carryAround(BOX, Lattice.Axis.Z_FACES, Interpolation.LINEAR, FAR);
        }
    }

    @Nested class CellsPlane extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.carryAround(PLANE, Lattice.Axis.CENTRES, Interpolation.LINEAR, FAR);
        }
    }

    /** The flow of {@link FlowPullbackTest}'s steps, bent round the things: departures stay between the same centres and paths uncut. */
    @Nested class Step extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.step(FlowOperators.setup(BOX, Interpolation.LINEAR, Interpolation.LINEAR, FlowOperators.OPEN, 1)
                    .withObstacles(FlowOperators.things(BOX)));
        }
    }
}
