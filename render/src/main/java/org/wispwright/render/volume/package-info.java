/**
 * Room: the boxes of numbers that everything else works on.
 * <p>Doors: {@link org.wispwright.render.volume.GridShape} (how many cells, how large, where),
 * {@link org.wispwright.render.volume.ScalarGrid} (values in cells),
 * {@link org.wispwright.render.volume.MacVelocity} (velocity on faces),
 * {@link org.wispwright.render.volume.NpyFile} (values on disk).
 * <p>Words: <i>cell</i> = one cube of the box; <i>face</i> = the square between two cells.
 * <p>May use: files. Held by {@code WallsTest}.
 */
package org.wispwright.render.volume;
