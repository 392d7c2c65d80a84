package org.wispwright.optimize.flow;

import org.junit.jupiter.api.Nested;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.volume.GridShape;

/** Outside checks O69, O70 for every operator of the flow, alone and as a whole step. Claerbout (1992), Earth Soundings Analysis. */
class FlowPullbackTest {
    private static final GridShape BOX = new GridShape(7, 6, 9, 0.5);
    private static final GridShape PLANE = new GridShape(9, 8, 1, 0.5);

    /** Some start from longer steps, for three halvings above the rounding of float; still off every kink. */
    abstract static class Longer extends PullbackContract {
        @Override protected double largestStep() {
            return 2;
        }
    }

    @Nested class ProjectionClosed extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.projection(BOX, Sides.CLOSED);
        }
    }

    @Nested class ProjectionOpen extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.projection(BOX, FlowOperators.OPEN);
        }
    }

    @Nested class ProjectionMixed extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.projection(BOX, new Sides(Side.WALL, Side.OPEN, Side.WALL, Side.OPEN, Side.OPEN, Side.WALL));
        }
    }

    @Nested class ProjectionPlane extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.projection(PLANE, new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.OPEN, Side.WALL, Side.WALL));
        }
    }

    @Nested class BuoyancyClosed extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.buoyancy(BOX, Sides.CLOSED);
        }
    }

    @Nested class BuoyancyOpen extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.buoyancy(BOX, FlowOperators.OPEN);
        }
    }

    @Nested class TraceBox extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.trace(BOX);
        }
    }

    @Nested class TracePlane extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.trace(PLANE);
        }
    }

    @Nested class CarryCellsLinear extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.carry(BOX, Lattice.Axis.CENTRES, Interpolation.LINEAR, Side.OPEN, Side.OPEN);
        }
    }

    @Nested class CarryCellsCubic extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.carry(BOX, Lattice.Axis.CENTRES, Interpolation.CUBIC, Side.OPEN, Side.OPEN);
        }
    }

    @Nested class CarryXLinear extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.carry(BOX, Lattice.Axis.X_FACES, Interpolation.LINEAR, Side.WALL, Side.OPEN);
        }
    }

    @Nested class CarryYLinear extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.carry(BOX, Lattice.Axis.Y_FACES, Interpolation.LINEAR, Side.OPEN, Side.WALL);
        }
    }

    @Nested class CarryZLinear extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.carry(new GridShape(6, 7, 8, 0.5), Lattice.Axis.Z_FACES, Interpolation.LINEAR, Side.OPEN, Side.OPEN);
        }
    }

    @Nested class CarryZCubic extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.carry(BOX, Lattice.Axis.Z_FACES, Interpolation.CUBIC, Side.WALL, Side.OPEN);
        }
    }

    @Nested class CarryPlane extends PullbackContract {
        @Override protected Operator operator() {
            return FlowOperators.carry(PLANE, Lattice.Axis.CENTRES, Interpolation.CUBIC, Side.OPEN, Side.OPEN);
        }
    }

    @Nested class StepLinear extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.step(BOX, Interpolation.LINEAR, Interpolation.LINEAR);
        }
    }

    @Nested class StepCubic extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.step(BOX, Interpolation.CUBIC, Interpolation.CUBIC);
        }
    }

    @Nested class StepPlane extends Longer {
        @Override protected Operator operator() {
            return FlowOperators.step(PLANE, Interpolation.LINEAR, Interpolation.CUBIC);
        }
    }
}
