package org.wispwright.optimize.flow;

import java.util.Arrays;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;

/**
 * The cells that one source feeds, and the share of its rates that each gets. Laid out once for a source that stays, else at every
 * substep.
 */
final class SourceCells {
    private final Source source;
    private final GridShape shape;
    private int[] cells;
    private double[] shares;

    SourceCells(Source source, GridShape shape) {
        this.source = source;
        this.shape = shape;
    }

    /** Adds what the source gives in a substep: {@code q[c] += dt share[c] rate strength}. The temperature may be null. */
    void feed(SmokeState to, Substep at, double seconds, double strength) {
        if (!ready(at)) {
            return;
        }
        add(to.density().values(), source.ratePerSecond() * strength, seconds);
        if (to.temperature() != null) {
            add(to.temperature().values(), source.kelvinPerSecond() * strength, seconds);
        }
    }

    /** The derivative by the strength: {@code dt sum_c share[c] (rate densityBar[c] + kelvin temperatureBar[c])}. */
    double strengthBar(SmokeState toBar, Substep at, double seconds) {
        if (!ready(at)) {
            return 0;
        }
        double sum = source.ratePerSecond() * along(toBar.density().values());
        return seconds * (toBar.temperature() == null ? sum : sum + source.kelvinPerSecond() * along(toBar.temperature().values()));
    }

    private boolean ready(Substep at) {
        if (!source.feeds(at.frame())) {
            return false;
        }
        if (cells == null || !source.centre().isStill()) {
            layOut(source.centre().at(at.to()));
        }
        return true;
    }

    private double along(float[] bar) {
        double sum = 0;
        for (int n = 0; n < cells.length; n++) {
            sum += shares[n] * bar[cells[n]];
        }
        return sum;
    }

    private void add(float[] values, double rate, double seconds) {
        for (int n = 0; n < cells.length; n++) {
            values[cells[n]] += (float) seconds * (float) (shares[n] * rate);
        }
    }

    private void layOut(Vec3 centre) {
        double h = shape.cellMetres();
        Vec3 half = source.form().half();
        int i0 = low(centre.x() - half.x(), shape.originX());
        int j0 = low(centre.y() - half.y(), shape.originY());
        int k0 = shape.isPlane() ? 0 : low(centre.z() - half.z(), shape.originZ());
        int i1 = high(centre.x() + half.x(), shape.originX(), shape.nx());
        int j1 = high(centre.y() + half.y(), shape.originY(), shape.ny());
        int k1 = shape.isPlane() ? 1 : high(centre.z() + half.z(), shape.originZ(), shape.nz());
        int room = Math.max(0, i1 - i0) * Math.max(0, j1 - j0) * Math.max(0, k1 - k0);
        cells = new int[room];
        shares = new double[room];
        int found = 0;
        for (int k = k0; k < k1; k++) {
            double z = shape.isPlane() ? 0 : shape.originZ() + (k + 0.5) * h - centre.z();
            for (int j = j0; j < j1; j++) {
                for (int i = i0; i < i1; i++) {
                    double x = shape.originX() + (i + 0.5) * h - centre.x();
                    double share = source.shareAt(x, shape.originY() + (j + 0.5) * h - centre.y(), z);
                    if (share > 0) {
                        cells[found] = shape.cell(i, j, k);
                        shares[found++] = share;
                    }
                }
            }
        }
        cells = Arrays.copyOf(cells, found);
        shares = Arrays.copyOf(shares, found);
    }

    private int low(double metres, double origin) {
        return (int) Math.max(0, Math.floor((metres - origin) / shape.cellMetres()));
    }

    private int high(double metres, double origin, int count) {
        return (int) Math.max(0, Math.min(count, Math.ceil((metres - origin) / shape.cellMetres())));
    }
}
