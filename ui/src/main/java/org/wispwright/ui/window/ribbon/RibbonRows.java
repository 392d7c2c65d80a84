package org.wispwright.ui.window.ribbon;

import java.awt.FontMetrics;

/**
 * Heights of the ribbon's rows from the top, in its pixels: frame numbers, pins, small pictures, held spans, plot.
 *
 * @param pins     top of the pins
 * @param pictures top of the pictures
 * @param holds    top of the held spans
 * @param plot     top of the plot
 * @param end      below the plot
 */
record RibbonRows(int pins, int pictures, int holds, int plot, int end) {
    static final int PIN = 12;
    private static final int PICTURE = 32;
    private static final int HOLD = 8;
    private static final int LEAST_PLOT = 22;

    /** @param height there is; what is over goes to the pictures */
    static RibbonRows of(FontMetrics small, int height) {
        int numbers = small.getHeight();
        int plot = Math.max(LEAST_PLOT, small.getHeight() + 4);
        int pictures = Math.max(PICTURE, height - numbers - PIN - HOLD - plot);
        return new RibbonRows(numbers, numbers + PIN, numbers + PIN + pictures, numbers + PIN + pictures + HOLD,
                numbers + PIN + pictures + HOLD + plot);
    }

    int picture() {
        return holds - pictures;
    }

    int hold() {
        return plot - holds;
    }
}
