package org.wispwright.ui.desk;

/** How two pictures are set against each other on the easel. */
public enum Against {
    /** The first alone. */ ALONE,
    /** The first on one side of a line, the second on the other. */ DIVIDER,
    /** A mix of both, in linear light. */ FADE,
    /** Each in its own half, looking at the same place. */ BESIDE,
    /** Their difference, times a gain. */ DIFFERENCE,
    /** The one and the other in turn; slowly, because flashing pictures can hurt (WCAG 2.x, 2.3.1). */ BLINK
}
