package org.wispwright.optimize.flow;

import java.util.List;
import java.util.Random;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.Solid;
import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/** How the contract test builds each operator of the flow: packing into doubles, points off the kinks. */
final class FlowOperators {
    static final Lanes ONE = new Lanes(1);
    static final Sides OPEN = new Sides(Side.OPEN, Side.OPEN, Side.OPEN, Side.OPEN, Side.OPEN, Side.OPEN);

    private FlowOperators() { }

    static double[] pack(float[]... parts) {
        int count = 0;
        for (float[] part : parts) {
            count += part.length;
        }
        double[] packed = new double[count];
        int at = 0;
        for (float[] part : parts) {
            for (float v : part) {
                packed[at++] = v;
            }
        }
        return packed;
    }

    static float[] all(MacVelocity u) {
        float[] values = java.util.Arrays.copyOf(u.x(), u.x().length + u.y().length + u.z().length);
        System.arraycopy(u.y(), 0, values, u.x().length, u.y().length);
        System.arraycopy(u.z(), 0, values, u.x().length + u.y().length, u.z().length);
        return values;
    }

    static void unpack(double[] packed, float[]... parts) {
        int at = 0;
        for (float[] part : parts) {
            for (int n = 0; n < part.length; n++) {
                part[n] = (float) packed[at++];
            }
        }
    }

    static void write(double[] out, float[]... parts) {
        double[] packed = pack(parts);
        System.arraycopy(packed, 0, out, 0, packed.length);
    }

    static void add(double[] to, float[]... parts) {
        double[] packed = pack(parts);
        for (int n = 0; n < packed.length; n++) {
            to[n] += packed[n];
        }
    }

    static float[] noise(int count, double middle, double spread, long seed) {
        Random random = new Random(seed);
        float[] values = new float[count];
        for (int n = 0; n < count; n++) {
            values[n] = (float) (middle + spread * (2 * random.nextDouble() - 1));
        }
        return values;
    }

    /** A velocity whose departures stay strictly between two centres: no direction of the tests crosses a border. */
    static MacVelocity wind(GridShape shape, double cellsPerSecond, double spread, long seed) {
        double h = shape.cellMetres();
        return new MacVelocity(shape, noise(shape.xFaces(), cellsPerSecond * h, spread * h, seed),
                noise(shape.yFaces(), cellsPerSecond * h, spread * h, seed + 1),
                shape.isPlane() ? new float[shape.zFaces()] : noise(shape.zFaces(), cellsPerSecond * h, spread * h, seed + 2));
    }

    /** A smooth shear flow, free of divergence, each component rising along the other two axes: no clamp of the cubic is near. */
    static MacVelocity shear(GridShape shape, float base, float by) {
        float h = (float) shape.cellMetres();
        MacVelocity u = new MacVelocity(shape);
        for (int k = 0; k <= shape.nz(); k++) {
            for (int j = 0; j <= shape.ny(); j++) {
                for (int i = 0; i <= shape.nx(); i++) {
                    if (j < shape.ny() && k < shape.nz()) {
                        u.x()[shape.xFace(i, j, k)] = h * (base + by * (0.021f * j + 0.013f * k + 0.002f * j * k));
                    }
                    if (i < shape.nx() && k < shape.nz()) {
                        u.y()[shape.yFace(i, j, k)] = h * (base + 0.03f * by + by * (0.017f * i + 0.012f * k + 0.002f * i * k));
                    }
                    if (i < shape.nx() && j < shape.ny() && !shape.isPlane()) {
                        u.z()[shape.zFace(i, j, k)] = h * (base + 0.05f * by + by * (0.012f * i + 0.018f * j + 0.002f * i * j));
                    }
                }
            }
        }
        return u;
    }

    static Operator projection(GridShape shape, Sides sides) {
        int count = shape.xFaces() + shape.yFaces() + shape.zFaces();
        Projection projection = new Projection(shape, sides, ONE);
        Operator.Forward run = (in, out) -> {
            MacVelocity u = new MacVelocity(shape);
            unpack(in, u.x(), u.y(), u.z());
            projection.apply(u);
            write(out, u.x(), u.y(), u.z());
        };
        double[] point = pack(noise(count, 0, 1, 5));
        return new Operator("projection " + shape.inWords() + " " + sides, count, count, true, point, pack(noise(count, 0, 1, 6)), run,
                (in, outBar, inBar) -> {
                    double[] bar = new double[count];
                    run.run(outBar, bar);
                    for (int n = 0; n < count; n++) {
                        inBar[n] += bar[n];
                    }
                });
    }

    static Operator buoyancy(GridShape shape, Sides sides) {
        Buoyancy buoyancy = new Buoyancy(shape, sides, ONE);
        int cells = shape.cells();
        int faces = shape.yFaces();
        return new Operator("buoyancy", cells, faces, true, pack(noise(cells, 0, 1, 1)), pack(noise(cells, 0, 1, 2)), (in, out) -> {
            float[] q = new float[cells];
            unpack(in, q);
            float[] v = new float[faces];
            buoyancy.forward(q, 0.7, v);
            write(out, v);
        }, (in, outBar, inBar) -> {
            float[] vBar = new float[faces];
            unpack(outBar, vBar);
            float[] qBar = new float[cells];
            buoyancy.pullback(vBar, 0.7, qBar);
            add(inBar, qBar);
        });
    }

    static Operator trace(GridShape shape) {
        MacVelocity point = wind(shape, 0.6, 0.1, 11);
        int count = shape.xFaces() + shape.yFaces() + shape.zFaces();
        Trace trace = new Trace(shape, ONE);
        MacVelocity way = wind(shape, 0, 0.05, 12);
        return new Operator("trace", count, 3 * shape.cells(), false, pack(point.x(), point.y(), point.z()), pack(way.x(), way.y(), way.z()),
                (in, out) -> {
                    MacVelocity u = new MacVelocity(shape);
                    unpack(in, u.x(), u.y(), u.z());
                    Displacement d = new Displacement(shape);
                    trace.forward(u, 1, d);
                    write(out, d.x, d.y, d.z);
                }, (in, outBar, inBar) -> {
                    MacVelocity u = new MacVelocity(shape);
                    unpack(in, u.x(), u.y(), u.z());
                    Displacement bar = new Displacement(shape);
                    unpack(outBar, bar.x, bar.y, bar.z);
                    MacVelocity uBar = new MacVelocity(shape);
                    trace.pullback(u, 1, bar, uBar);
                    add(inBar, uBar.x(), uBar.y(), uBar.z());
                });
    }

    /** Inputs: the carried values, then the displacement. */
    static Operator carry(GridShape shape, Lattice.Axis axis, Interpolation interpolation, Side low, Side high) {
        Lattice lattice = Lattice.of(shape, axis);
        Carry carry = axis == Lattice.Axis.CENTRES ? Carry.ofCells(shape, interpolation, ONE)
                : Carry.ofFaces(shape, axis, interpolation, low, high, ONE);
        int cells = shape.cells();
        int count = lattice.count();
        // Off the clamps of the cubic too: a smooth field with noise far below its slope.
        float[] q = new float[count];
        for (int n = 0; n < count; n++) {
            int i = n % lattice.mx();
            int j = n / lattice.mx() % lattice.my();
            int k = n / (lattice.mx() * lattice.my());
            q[n] = (float) (0.3 * i + 0.05 * j * j + 0.13 * k - 2 + 0.1 * Math.sin(i + 2.0 * j + 3.0 * k));
        }
        float[] d = noise(3 * cells, 0.4, 0.2, 22);
        if (shape.isPlane()) {
            java.util.Arrays.fill(d, 2 * cells, 3 * cells, 0f);
        }
        double[] way = pack(noise(count, 0, 0.05, 23), noise(3 * cells, 0, 0.05, 24));
        return new Operator("carry " + axis + " " + interpolation, count + 3 * cells, count, false, pack(q, d), way, (in, out) -> {
            float[] values = new float[count];
            Displacement moved = new Displacement(shape);
            unpack(in, values, moved.x, moved.y, moved.z);
            float[] carried = noise(count, 0, 1, 99);
            carry.forward(values, moved, carried);
            write(out, carried);
        }, (in, outBar, inBar) -> {
            float[] values = new float[count];
            Displacement moved = new Displacement(shape);
            unpack(in, values, moved.x, moved.y, moved.z);
            float[] bar = new float[count];
            unpack(outBar, bar);
            float[] valuesBar = new float[count];
            Displacement movedBar = new Displacement(shape);
            carry.pullback(values, moved, moved.reachInZ(ONE, new float[shape.nz()]), bar, valuesBar, movedBar);
            add(inBar, valuesBar, movedBar.x, movedBar.y, movedBar.z);
        });
    }

    /** A ball and a tilted plate, both on the move. */
    static List<Obstacle> things(GridShape shape) {
        double h = shape.cellMetres();
        Vec3 middle = new Vec3(0.55 * shape.nx() * h, 0.5 * shape.ny() * h, 0.5 * shape.nz() * h);
        Curve ball = new Curve(List.of(0.0, 4.0), List.of(middle, middle.plus(new Vec3(0.4 * h, 0.2 * h, 0))));
        Curve turn = new Curve(List.of(0.0, 4.0), List.of(new Vec3(0, 0, 0.4), new Vec3(0, 0, 0.5)));
        return List.of(new Obstacle("ball", new Solid.Ball(1.4 * h), ball, Curve.still(new Vec3(0, 0, 0))),
                new Obstacle("plate", new Solid.Box(new Vec3(0.2 * h, 1.6 * h, 9 * h)), Curve.still(new Vec3(1.6 * h, 2.5 * h, 2 * h)),
                        turn));
    }

    static SolidCells solids(GridShape shape) {
        return new SolidCells(shape, things(shape), 1, 2, 1, ONE);
    }

    /** Forward moves the solids, so it is affine; the contract looks at differences alone. */
    static Operator solidProjection(GridShape shape, Sides sides) {
        int count = shape.xFaces() + shape.yFaces() + shape.zFaces();
        SolidCells solids = solids(shape);
        SolidProjection projection = new SolidProjection(shape, sides, ONE);
        PressureLinks links = new PressureLinks(shape, sides, solids, ONE);
        return new Operator("projection with solids " + shape.inWords() + " " + sides, count, count, true, pack(noise(count, 0, 1, 5)),
                pack(noise(count, 0, 1, 6)), (in, out) -> {
                    MacVelocity u = new MacVelocity(shape);
                    unpack(in, u.x(), u.y(), u.z());
                    projection.forward(u, solids, links);
                    write(out, u.x(), u.y(), u.z());
                }, (in, outBar, inBar) -> {
                    MacVelocity u = new MacVelocity(shape);
                    unpack(outBar, u.x(), u.y(), u.z());
                    projection.pullback(u, solids, links);
                    add(inBar, u.x(), u.y(), u.z());
                });
    }

    /**
     * As {@link #carry}, around solids.
     *
     * @param low  least displacement along x, cells; those along y and z lie 0.15 and 0.3 above it, so that no path changes the order of
     *             the faces that it passes
     */
    static Operator carryAround(GridShape shape, Lattice.Axis axis, Interpolation interpolation, double low) {
        Lattice lattice = Lattice.of(shape, axis);
        CarryAround carry = axis == Lattice.Axis.CENTRES ? CarryAround.ofCells(shape, interpolation, ONE)
                : CarryAround.ofFaces(shape, axis, interpolation, Side.OPEN, Side.OPEN, ONE);
        SolidCells solids = solids(shape);
        int cells = shape.cells();
        int count = lattice.count();
        boolean linear = interpolation == Interpolation.LINEAR;
        float[] q = new float[count];
        for (int n = 0; n < count; n++) {
            int i = n % lattice.mx();
            int j = n / lattice.mx() % lattice.my();
            int k = n / (lattice.mx() * lattice.my());
            // Linear: rough, so that rounding is far below what is tested. Cubic: smooth, off its clamps.
            q[n] = (float) (linear ? Math.sin(1.1 * i + 2.0 * j + 3.0 * k)
                    : 0.3 * i + 0.05 * j * j + 0.13 * k - 2 + 0.1 * Math.sin(i + 2.0 * j + 3.0 * k));
        }
        boolean plane = shape.isPlane();
        double[] point = pack(q, noise(cells, low + 0.03, 0.02, 22), noise(cells, low + 0.18, 0.02, 25), noise(cells, plane ? 0 : low
                + 0.33,
                plane ? 0 : 0.02, 26));
        double[] way = pack(noise(count, 0, 0.05, 23), noise(2 * cells, 0, 0.02, 24), noise(cells, 0, plane ? 0 : 0.02, 27));
        return new Operator("carry around solids " + axis + " " + interpolation + " " + low, count + 3 * cells, count, false, point, way,
                (in, out) -> {
                    float[] values = new float[count];
                    Displacement moved = new Displacement(shape);
                    unpack(in, values, moved.x, moved.y, moved.z);
                    float[] carried = noise(count, 0, 1, 99);
                    carry.forward(values, moved, solids, carried);
                    write(out, carried);
                }, (in, outBar, inBar) -> {
                    float[] values = new float[count];
                    Displacement moved = new Displacement(shape);
                    unpack(in, values, moved.x, moved.y, moved.z);
                    float[] bar = new float[count];
                    unpack(outBar, bar);
                    float[] valuesBar = new float[count];
                    Displacement movedBar = new Displacement(shape);
                    carry.pullback(values, moved, moved.reachInZ(ONE, new float[shape.nz()]), solids, bar, valuesBar, movedBar);
                    add(inBar, valuesBar, movedBar.x, movedBar.y, movedBar.z);
                });
    }

    static FlowSetup setup(GridShape shape, Interpolation velocity, Interpolation density, Sides sides, double perSecond) {
        return new FlowSetup(shape, new FrameRange(1, 9, perSecond), 1, velocity, density, sides, 0.2, 0.3,
                List.of(new Source("test ball", 2.5 * shape.cellMetres(), 2.5 * shape.cellMetres(), 2.5 * shape.cellMetres(),
                        2 * shape.cellMetres(), shape.cellMetres(), 1.5, 1, 9)));
    }

    /** Inputs: density, velocity, force. Outputs: density, velocity. */
    static Operator step(GridShape shape, Interpolation velocity, Interpolation density) {
        return step(setup(shape, velocity, density, OPEN, 1));
    }

    /** As above, of any set-up. */
    static Operator step(FlowSetup setup) {
        GridShape shape = setup.grid();
        SmokeSolver solver = new SmokeSolver(setup, ONE);
        int faces = shape.xFaces() + shape.yFaces() + shape.zFaces();
        int cells = shape.cells();
        MacVelocity u = shear(shape, 0.33f, 0.8f);
        MacVelocity f = shear(shape, 0.01f, 0.1f);
        MacVelocity uWay = shear(shape, 0.04f, -0.1f);
        MacVelocity fWay = shear(shape, -0.04f, 0.08f);
        ScalarGrid q = new ScalarGrid(shape);
        for (int n = 0; n < cells; n++) {
            q.values()[n] = (float) (0.02 * (n % shape.nx()) + 0.03 * (n / shape.nx() % shape.ny()) + 0.01 * (n / (shape.nx() * shape.ny()))
                    + 0.004 * (n % shape.nx()) * (n / shape.nx() % shape.ny()));
        }
        double[] point = pack(q.values(), u.x(), u.y(), u.z(), f.x(), f.y(), f.z());
        double[] way = pack(noise(cells, 0.1, 0.002, 44), uWay.x(), uWay.y(), uWay.z(), fWay.x(), fWay.y(), fWay.z());
        return new Operator("step " + setup, cells + 2 * faces, cells + faces, false, point, way, (in, out) -> {
            SmokeState state = new SmokeState(shape);
            MacVelocity force = new MacVelocity(shape);
            read(in, state, force);
            SmokeState next = new SmokeState(shape);
            solver.step(state, force, new Substep(2, 0, 1), false, next);
            write(out, next.density().values(), next.velocity().x(), next.velocity().y(), next.velocity().z());
        }, (in, outBar, inBar) -> {
            SmokeState state = new SmokeState(shape);
            MacVelocity force = new MacVelocity(shape);
            read(in, state, force);
            SmokeState next = new SmokeState(shape);
            solver.step(state, force, new Substep(2, 0, 1), false, next);
            SmokeState bar = new SmokeState(shape);
            unpack(outBar, bar.density().values(), bar.velocity().x(), bar.velocity().y(), bar.velocity().z());
            MacVelocity forceBar = new MacVelocity(shape);
            solver.pullback(state, next.velocity(), new Substep(2, 0, 1), false, bar, forceBar);
            add(inBar, bar.density().values(), bar.velocity().x(), bar.velocity().y(), bar.velocity().z(),
                    forceBar.x(), forceBar.y(), forceBar.z());
        });
    }

    private static void read(double[] in, SmokeState state, MacVelocity force) {
        unpack(in, state.density().values(), state.velocity().x(), state.velocity().y(), state.velocity().z(),
                force.x(), force.y(), force.z());
    }
}
