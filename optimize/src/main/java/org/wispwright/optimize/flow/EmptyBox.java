package org.wispwright.optimize.flow;

import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** A box without solids. */
final class EmptyBox implements Medium {
    private final Lanes lanes;
    private final Carry carryX;
    private final Carry carryY;
    private final Carry carryZ;
    private final Carry carryCells;
    private final Projection projection;

    EmptyBox(FlowSetup setup, Lanes lanes) {
        this.lanes = lanes;
        GridShape shape = setup.grid();
        Sides sides = setup.sides();
        carryX = Carry.ofFaces(shape, Lattice.Axis.X_FACES, setup.velocity(), sides.left(), sides.right(), lanes);
        carryY = Carry.ofFaces(shape, Lattice.Axis.Y_FACES, setup.velocity(), sides.floor(), sides.top(), lanes);
        carryZ = Carry.ofFaces(shape, Lattice.Axis.Z_FACES, setup.velocity(), sides.back(), sides.front(), lanes);
        carryCells = Carry.ofCells(shape, setup.density(), lanes);
        projection = new Projection(shape, sides, lanes);
    }

    @Override
    public void ready(Substep at) {
    }

    @Override
    public void carryFaces(MacVelocity u, Displacement d, MacVelocity out) {
        carryX.forward(u.x(), d, out.x());
        carryY.forward(u.y(), d, out.y());
        carryZ.forward(u.z(), d, out.z());
    }

    @Override
    public void carryFacesBack(MacVelocity u, Displacement d, int reach, MacVelocity outBar, MacVelocity uBar, Displacement dBar) {
        carryX.pullback(u.x(), d, reach, outBar.x(), uBar.x(), dBar);
        carryY.pullback(u.y(), d, reach, outBar.y(), uBar.y(), dBar);
        carryZ.pullback(u.z(), d, reach, outBar.z(), uBar.z(), dBar);
    }

    @Override
    public void carryCells(float[] q, Displacement d, float[] out) {
        carryCells.forward(q, d, out);
    }

    @Override
    public void carryCellsBack(float[] q, Displacement d, int reach, float[] outBar, float[] qBar, Displacement dBar) {
        carryCells.pullback(q, d, reach, outBar, qBar, dBar);
    }

    @Override
    public void project(MacVelocity u) {
        projection.apply(u);
    }

    @Override
    public void projectBack(MacVelocity uBar) {
        projection.apply(uBar);
    }

    @Override
    public void clearSolids(float[] cells) {
    }

    @Override
    public double relativeDivergence(MacVelocity u) {
        return DivergenceKernel.relativeMax(u, projection.workspace(), k -> { }, lanes);
    }
}
