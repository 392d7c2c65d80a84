package org.wispwright.warp.retouch;

/**
 * What a stroke does to a pixel with coverage m in 0..1. All act on premultiplied RGBA and on opacity a, so that adding and
 * removing stay physical: a never leaves 0..1. Composition as in Porter and Duff (1984), SIGGRAPH 84, 253-259.
 */
public enum Brush {
    /** {@code rgba' = rgba + m (1 - a) (c, 1)}: smoke of colour c laid behind what is there; c is the colour of the smoke near it. */
    ADD,
    /** {@code rgba' = (1 - m) rgba}: smoke thinned, colour kept. */
    REMOVE,
    /** {@code rgba' = rgba + m (blurred - rgba)}: blurred with a Gaussian whose width follows the stroke's radius. */
    SOFTEN,
    /**
     * {@code rgba' = rgba + m (original - rgba)}: the picture as it was before any operation of the retouch. Coverage 1 gives the very
     * bits of the original; a place that nothing has changed keeps its own.
     */
    RESTORE,
    /**
     * {@code rgba'(p) = rgba(p - m T(p))}, T the travel of the stroke near p, at most its radius: smoke moved the way the stroke went,
     * read bicubically. A dab has no direction and changes nothing.
     */
    PUSH,
    /** {@code a' = mean + (1 - m) (a - mean)}, mean the opacity blurred with sigma = the radius; colour follows: local contrast lowered. */
    EVEN,
    /** {@code a' = mean + (1 + m) (a - mean)}, then clamped to 0..1; colour follows: local contrast raised. */
    LIFT
}
