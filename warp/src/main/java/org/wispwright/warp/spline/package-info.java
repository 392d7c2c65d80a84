/**
 * Room: smooth maps of the plane that pass through given landmarks.
 * <p>Doors: {@link org.wispwright.warp.spline.ThinPlateSpline}, {@link org.wispwright.warp.spline.SplineLattice} (how far it moves
 * every pixel of a picture, quicker, within a proven distance of it).
 * <p>Words: <i>landmark</i> = a place the map is told about; <i>target</i> = where it must go; <i>bending energy</i> = how far the
 * map is from affine.
 * <p>May use: EJML. Must not use: other rooms of ours. Held by {@code WallsTest}.
 */
package org.wispwright.warp.spline;
