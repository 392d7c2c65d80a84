package org.wispwright.optimize.force;

import java.util.List;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * A few force handles where a person would put them, each a ball with a soft edge: the force at p, with r = p - centre and
 * {@code w = 3t^2 - 2t^3}, {@code t = 1 - |r| / radius}, is w times what its {@link Kind} says.
 * <p>Linear in the strengths, of which each handle has two, m/s2: one for the first half of the range and one for the second, blended
 * smoothly over the middle third. Layout: handle after handle, early before late.
 */
public final class HandleForce implements ForceModel {
    private final GridShape shape;
    private final int steps;
    private final List<MacVelocity> fields;

    /** What a handle does; a is its direction or axis. */
    public enum Kind {
        /** Pushes along a. */ WIND {
            @Override
            Vec3 at(Vec3 a, Vec3 r) {
                return a;
            }
        },
        /** Turns about a: {@code a x r}. */ VORTEX {
            @Override
            Vec3 at(Vec3 a, Vec3 r) {
                return a.cross(r);
            }
        },
        /** Draws to the centre: {@code -r}; a is not used. */ ATTRACT {
            @Override
            Vec3 at(Vec3 a, Vec3 r) {
                return r.times(-1);
            }
        };

        /** @param r from the centre, in radii */
        abstract Vec3 at(Vec3 a, Vec3 r);
    }

    /** One handle; lengths in metres. */
    public record Handle(Kind kind, Vec3 centre, Vec3 a, double radius) { }

    /** @param steps number of force steps, at least 1 */
    public HandleForce(GridShape shape, int steps, List<Handle> handles) {
        this.shape = shape;
        this.steps = steps;
        fields = handles.stream().map(this::field).toList();
    }

    private MacVelocity field(Handle handle) {
        MacVelocity out = new MacVelocity(shape);
        for (int k = 0; k <= shape.nz(); k++) {
            for (int j = 0; j <= shape.ny(); j++) {
                for (int i = 0; i <= shape.nx(); i++) {
                    if (j < shape.ny() && k < shape.nz()) {
                        out.x()[shape.xFace(i, j, k)] = (float) at(handle, i, j + 0.5, k + 0.5).x();
                    }
                    if (i < shape.nx() && k < shape.nz()) {
                        out.y()[shape.yFace(i, j, k)] = (float) at(handle, i + 0.5, j, k + 0.5).y();
                    }
                    if (i < shape.nx() && j < shape.ny()) {
                        out.z()[shape.zFace(i, j, k)] = (float) at(handle, i + 0.5, j + 0.5, k).z();
                    }
                }
            }
        }
        return out;
    }

    private Vec3 at(Handle handle, double i, double j, double k) {
        double h = shape.cellMetres();
        Vec3 r = new Vec3(shape.originX() + i * h, shape.originY() + j * h, shape.originZ() + k * h).minus(handle.centre)
                .times(1 / handle.radius);
        double t = Math.max(0, 1 - r.length());
        return handle.kind.at(handle.a, r).times(t * t * (3 - 2 * t));
    }

    @Override
    public int unknowns() {
        return 2 * fields.size();
    }

    /** Share of the late strength in a step. */
    private double late(int step) {
        double t = Math.max(0, Math.min(1, 3 * (step + 0.5) / steps - 1));
        return t * t * (3 - 2 * t);
    }

    @Override
    public void force(double[] x, int step, MacVelocity out) {
        double late = late(step);
        out.fill(0);
        for (int n = 0; n < fields.size(); n++) {
            float strength = (float) ((1 - late) * x[2 * n] + late * x[2 * n + 1]);
            add(strength, fields.get(n).x(), out.x());
            add(strength, fields.get(n).y(), out.y());
            add(strength, fields.get(n).z(), out.z());
        }
    }

    private static void add(float factor, float[] from, float[] to) {
        for (int n = 0; n < to.length; n++) {
            to[n] += factor * from[n];
        }
    }

    @Override
    public void pullback(MacVelocity forceBar, int step, double[] xBar) {
        double late = late(step);
        for (int n = 0; n < fields.size(); n++) {
            MacVelocity field = fields.get(n);
            double along = dot(field.x(), forceBar.x()) + dot(field.y(), forceBar.y()) + dot(field.z(), forceBar.z());
            xBar[2 * n] += (1 - late) * along;
            xBar[2 * n + 1] += late * along;
        }
    }

    private static double dot(float[] a, float[] b) {
        double sum = 0;
        for (int n = 0; n < a.length; n++) {
            sum += (double) a[n] * b[n];
        }
        return sum;
    }
}
