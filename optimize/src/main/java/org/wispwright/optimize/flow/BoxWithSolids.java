package org.wispwright.optimize.flow;

import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * A box with solids. They stand where they are at the end of the substep, and move as in its middle; still ones are laid out once.
 */
final class BoxWithSolids implements Medium {
    private final FlowSetup setup;
    private final GridShape shape;
    private final Lanes lanes;
    private final CarryAround carryX;
    private final CarryAround carryY;
    private final CarryAround carryZ;
    private final CarryAround carryCells;
    private final SolidProjection projection;
    private final float[] scratch;
    private final boolean still;
    private Substep laidOut;
    private SolidCells solids;
    private PressureLinks links;

    BoxWithSolids(FlowSetup setup, Lanes lanes) {
        this.setup = setup;
        this.lanes = lanes;
        shape = setup.grid();
        Sides sides = setup.sides();
        carryX = CarryAround.ofFaces(shape, Lattice.Axis.X_FACES, setup.velocity(), sides.left(), sides.right(), lanes);
        carryY = CarryAround.ofFaces(shape, Lattice.Axis.Y_FACES, setup.velocity(), sides.floor(), sides.top(), lanes);
        carryZ = CarryAround.ofFaces(shape, Lattice.Axis.Z_FACES, setup.velocity(), sides.back(), sides.front(), lanes);
        carryCells = CarryAround.ofCells(shape, setup.density(), lanes);
        projection = new SolidProjection(shape, sides, lanes);
        scratch = new float[shape.cells()];
        still = setup.obstacles().stream().allMatch(Obstacle::isStill);
    }

    @Override
    public void ready(Substep at) {
        if (laidOut == null || !still && !laidOut.equals(at)) {
            solids = new SolidCells(shape, setup.obstacles(), at.from(), at.to(), setup.frames().perSecond(), lanes);
            links = new PressureLinks(shape, setup.sides(), solids, lanes);
            laidOut = at;
        }
    }

    @Override
    public void carryFaces(MacVelocity u, Displacement d, MacVelocity out) {
        carryX.forward(u.x(), d, solids, out.x());
        carryY.forward(u.y(), d, solids, out.y());
        carryZ.forward(u.z(), d, solids, out.z());
    }

    @Override
    public void carryFacesBack(MacVelocity u, Displacement d, int reach, MacVelocity outBar, MacVelocity uBar, Displacement dBar) {
        carryX.pullback(u.x(), d, reach, solids, outBar.x(), uBar.x(), dBar);
        carryY.pullback(u.y(), d, reach, solids, outBar.y(), uBar.y(), dBar);
        carryZ.pullback(u.z(), d, reach, solids, outBar.z(), uBar.z(), dBar);
    }

    @Override
    public void carryCells(float[] q, Displacement d, float[] out) {
        carryCells.forward(q, d, solids, out);
    }

    @Override
    public void carryCellsBack(float[] q, Displacement d, int reach, float[] outBar, float[] qBar, Displacement dBar) {
        carryCells.pullback(q, d, reach, solids, outBar, qBar, dBar);
    }

    @Override
    public void project(MacVelocity u) {
        projection.forward(u, solids, links);
    }

    @Override
    public void projectBack(MacVelocity uBar) {
        projection.pullback(uBar, solids, links);
    }

    @Override
    public void clearSolids(float[] cells) {
        lanes.forEach(shape.nz(), k -> solids.clear(cells, k));
    }

    @Override
    public double relativeDivergence(MacVelocity u) {
        return DivergenceKernel.relativeMax(u, scratch, k -> solids.clear(scratch, k), lanes);
    }

    /** Iterations of the last projection. */
    int lastIterations() {
        return projection.lastIterations();
    }
}
