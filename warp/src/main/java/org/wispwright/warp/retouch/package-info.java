/**
 * Room: what an artist asks of a picture, as values, and the picture that results.
 * <p>Doors: {@link org.wispwright.warp.retouch.Retouch} (the ordered list of operations: {@link org.wispwright.warp.retouch.Stroke},
 * {@link org.wispwright.warp.retouch.MeshWarp}, {@link org.wispwright.warp.retouch.OutlineWarp}, each within a
 * {@link org.wispwright.warp.matte.Matte} or anywhere, {@link org.wispwright.warp.retouch.Repaint}),
 * {@link org.wispwright.warp.retouch.Retoucher} (applies it to a picture and says where it acts),
 * {@link org.wispwright.warp.retouch.Folds} (where it turns the picture over), {@link org.wispwright.warp.retouch.LiveWarp} (a mesh warp
 * that follows the hand),
 * {@link org.wispwright.warp.retouch.Canvas} and {@link org.wispwright.warp.retouch.LiveStroke} (a stroke while somebody draws).
 * <p>Words: <i>position</i> = fraction of the raster's height from its top left corner, see {@link org.wispwright.warp.matte.Point};
 * <i>coverage</i> = how much of a brush a pixel gets, 0 to 1; <i>handle</i> = a place on the picture and where it is pulled to;
 * <i>feather</i> = width of a soft edge, fraction of the height.
 * <p>May use: render's picture; warp's matte, mesh, outline, spline and resample. Must not use: optimize, ui, javax.swing.
 * Held by {@code WallsTest}.
 */
package org.wispwright.warp.retouch;
