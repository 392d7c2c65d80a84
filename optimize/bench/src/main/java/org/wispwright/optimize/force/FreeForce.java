package org.wispwright.optimize.force;

import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * One unknown for every face and step: the force that anyone writes down first. Forward {@code f = scale x}, pullback
 * {@code xBar += scale fBar}, scale = root of cells times steps, so that the squared length of x is the force's mean square over box and
 * range as in {@link ForceBasis}. Layout: step after step, in each the x, y and z faces.
 */
public final class FreeForce implements ForceModel {
    private final int aStep;
    private final int steps;
    private final double scale;

    /** @param steps number of force steps, at least 1 */
    public FreeForce(GridShape shape, int steps) {
        this.steps = steps;
        aStep = shape.xFaces() + shape.yFaces() + shape.zFaces();
        scale = Math.sqrt((double) shape.cells() * steps);
    }

    @Override
    public int unknowns() {
        return Math.multiplyExact(aStep, steps);
    }

    @Override
    public void force(double[] x, int step, MacVelocity out) {
        int at = step * aStep;
        for (float[] component : new float[][] {out.x(), out.y(), out.z()}) {
            for (int n = 0; n < component.length; n++) {
                component[n] = (float) (scale * x[at++]);
            }
        }
    }

    @Override
    public void pullback(MacVelocity forceBar, int step, double[] xBar) {
        int at = step * aStep;
        for (float[] component : new float[][] {forceBar.x(), forceBar.y(), forceBar.z()}) {
            for (float bar : component) {
                xBar[at++] += scale * bar;
            }
        }
    }
}
