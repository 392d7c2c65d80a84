package org.wispwright.warp.matte;

/**
 * {@link PressedPiece} for many pixels at once, in float, where all it depends on grows evenly along the piece: the loops. Each is short
 * and has one index for all its arrays; so the compiler does several pixels at a time, which makes them five to ten times as quick.
 */
final class PressedRow {
    /** What keeps a division by 0 away. */
    private static final float TINY = 1e-12f;
    /** How far off the core the search begins, as a share of the edge's width. */
    private static final float BESIDE = 0.2f;

    /** 0, 1, 2, ... */
    private final float[] count;
    /** Where the pixel is along the piece, and the square of how far beside it. */
    final float[] along;
    final float[] beside2;
    /** The nearest place of the piece, and the place that is looked at, along the piece. */
    private final float[] near;
    final float[] place;
    private final float[] distance;
    private final float[] perWide;
    private final float[] inside;
    private final float[] share;
    private final float[] shareRises;
    /** Coverage from that place. */
    final float[] value;
    /** Slope of coverage there towards the harder end, times distance by share: its sign counts. */
    final float[] rises;
    /** Newton's step to where coverage rises no more: the slope by how it falls, {@code 6 most ((1 - s) / wide + s'^2)} and no more. */
    final float[] step;
    /** Coverage of a touch as hard as the hardest at the nearest place, which no place passes. */
    final float[] bound;

    /** Room for so many pixels. */
    PressedRow(int pixels) {
        count = new float[pixels];
        for (int n = 0; n < pixels; n++) {
            count[n] = n;
        }
        along = new float[pixels];
        beside2 = new float[pixels];
        near = new float[pixels];
        place = new float[pixels];
        distance = new float[pixels];
        perWide = new float[pixels];
        inside = new float[pixels];
        share = new float[pixels];
        shareRises = new float[pixels];
        value = new float[pixels];
        rises = new float[pixels];
        step = new float[pixels];
        bound = new float[pixels];
    }

    /** A number that grows evenly along a piece. */
    record Even(float start, float slope) {
        /** From one number at the start to another {@code length} on. */
        static Even between(double start, double end, double length) {
            return new Even((float) start, (float) ((end - start) / length));
        }
    }

    /**
     * What a piece is: {@code s = centre + (middle - d) / wide}, coverage {@code most s^2 (3 - 2 s)}, s cut to 0..1.
     *
     * @param ahead 1 where the end is pressed harder, -1 where the start is
     */
    record Shape(float length, Even middle, Even wide, Even most, float centre, float ahead) {
    }

    /** Sets along and beside of a row's pixels, the first {@code from} columns, and {@code shift} back, from the piece's start. */
    void row(int pixels, float from, float shift, float dy, float vx, float vy) {
        float alongRow = dy * vy;
        float besideRow = dy * vx;
        for (int n = 0; n < pixels; n++) {
            float px = count[n] + from - shift;
            float beside = px * vy - besideRow;
            along[n] = px * vx + alongRow;
            beside2[n] = beside * beside;
        }
    }

    /** The nearest places are looked at. */
    void nearest(int pixels, Shape shape) {
        float length = shape.length;
        for (int n = 0; n < pixels; n++) {
            near[n] = Math.min(length, Math.max(0f, along[n]));
            place[n] = near[n];
        }
        look(pixels, shape);
    }

    /** Sets {@link #bound}, after {@link #nearest}. */
    void bound(int pixels, Tip.Touch hardest) {
        float edge = (float) hardest.edge();
        float per = (float) hardest.perWide();
        float most = (float) hardest.most();
        for (int n = 0; n < pixels; n++) {
            float s = Math.min(1f, Math.max(0f, edge - distance[n] * per));
            bound[n] = most * s * s * (3 - 2 * s);
        }
    }

    /**
     * Looks at where the search begins: at the nearest place, but where that is in the core of a touch, a little off it, towards the harder
     * end.
     */
    void begin(int pixels, Shape shape, float core) {
        float off = core + BESIDE * (shape.wide.start + shape.wide.slope * shape.length / 2);
        float ahead = shape.ahead;
        float length = shape.length;
        for (int n = 0; n < pixels; n++) {
            near[n] = Math.min(length, Math.max(0f, along[n]));
            place[n] = along[n] + ahead * (float) Math.sqrt(Math.max(0f, off * off - beside2[n]));
        }
        cut(pixels, shape);
        look(pixels, shape);
    }

    /**
     * Looks at where Newton's step leads, but no farther than half the edge's width, not off the piece nor back behind the nearest place.
     */
    void step(int pixels, Shape shape) {
        float most = (shape.wide.start + shape.wide.slope * shape.length / 2) / 2;
        for (int n = 0; n < pixels; n++) {
            place[n] += Math.min(most, Math.max(-most, step[n]));
        }
        cut(pixels, shape);
        look(pixels, shape);
    }

    private void cut(int pixels, Shape shape) {
        float length = shape.length;
        if (shape.ahead > 0) {
            for (int n = 0; n < pixels; n++) {
                place[n] = Math.min(length, Math.max(near[n], place[n]));
            }
        } else {
            for (int n = 0; n < pixels; n++) {
                place[n] = Math.min(near[n], Math.max(0f, place[n]));
            }
        }
    }

    /** Whether the place found is within so many pixels of the peak, or near it and so little below. */
    boolean found(int n, float within, float below) {
        float off = Math.abs(step[n]);
        return off <= within || off <= 5 * within && 0.5f * off * Math.abs(rises[n]) * share[n] <= below * distance[n];
    }

    /** Sets {@link #step} for where was looked; the slope of s, times d, falls by 1 / wide a pixel. */
    void newton(int pixels, Shape shape) {
        float mostStart = shape.most.start;
        float mostSlope = shape.most.slope;
        for (int n = 0; n < pixels; n++) {
            step[n] = (1 - share[n]) * perWide[n] + shareRises[n] * shareRises[n] / (distance[n] + TINY);
        }
        for (int n = 0; n < pixels; n++) {
            step[n] = step[n] * (mostStart + mostSlope * place[n]) + TINY;
        }
        float sixth = shape.ahead / 6;
        for (int n = 0; n < pixels; n++) {
            step[n] = sixth * rises[n] / step[n];
        }
    }

    private void look(int pixels, Shape shape) {
        float middleStart = shape.middle.start;
        float middleSlope = shape.middle.slope;
        float wideStart = shape.wide.start;
        float wideSlope = shape.wide.slope;
        float centre = shape.centre;
        for (int n = 0; n < pixels; n++) {
            float away = place[n] - along[n];
            distance[n] = (float) Math.sqrt(beside2[n] + away * away);
            perWide[n] = 1f / (wideStart + wideSlope * place[n]);
        }
        for (int n = 0; n < pixels; n++) {
            inside[n] = (middleStart + middleSlope * place[n] - distance[n]) * perWide[n];
            share[n] = Math.min(1f, Math.max(0f, centre + inside[n]));
        }
        for (int n = 0; n < pixels; n++) {
            shareRises[n] = ((middleSlope - wideSlope * inside[n]) * distance[n] + along[n] - place[n]) * perWide[n];
        }
        float mostStart = shape.most.start;
        float mostSlope = shape.most.slope;
        for (int n = 0; n < pixels; n++) {
            value[n] = (mostStart + mostSlope * place[n]) * share[n] * share[n] * (3 - 2 * share[n]);
        }
        float six = 6 * shape.ahead;
        for (int n = 0; n < pixels; n++) {
            rises[n] = six * (mostStart + mostSlope * place[n]) * (1 - share[n]) * shareRises[n];
        }
        float rests = shape.ahead * mostSlope;
        for (int n = 0; n < pixels; n++) {
            rises[n] += rests * share[n] * (3 - 2 * share[n]) * distance[n];
        }
    }
}
