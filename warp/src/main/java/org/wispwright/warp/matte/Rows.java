package org.wispwright.warp.matte;

/** Which rows of a window a shape may meet, and which columns of a row; a pixel more than needed on each side, never one less. */
final class Rows {
    /** First and last row; none if first is after last. */
    int from;
    int to;
    /** First and last column of the row at hand; none if left is after right. */
    int left;
    int right;

    private final Window window;

    Rows(Window window) {
        this.window = window;
    }

    void between(double top, double bottom) {
        from = (int) Math.max(window.top(), Math.floor(top));
        to = (int) Math.min(window.top() + window.height() - 1, Math.ceil(bottom));
    }

    void all() {
        left = window.left();
        right = window.left() + window.width() - 1;
    }

    /** Keeps the columns i with {@code low <= slope i <= high}. */
    void keep(double slope, double low, double high) {
        if (Math.abs(slope) < 1e-9) {
            // Hardly any slope: a column more or less makes no difference to a whole row.
            if (low > 1 || high < -1) {
                right = left - 1;
            }
            return;
        }
        double first = slope > 0 ? low / slope : high / slope;
        double last = slope > 0 ? high / slope : low / slope;
        left = (int) Math.max(left, Math.floor(first) - 1);
        right = (int) Math.min(right, Math.ceil(last) + 1);
    }
}
