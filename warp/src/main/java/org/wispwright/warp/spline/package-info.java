/**
 * Room: smooth maps of the plane that pass through given landmarks.
 * <p>Door: {@link org.wispwright.warp.spline.ThinPlateSpline}.
 * <p>Words: <i>landmark</i> = a place the map is told about; <i>target</i> = where it must go; <i>bending energy</i> = how far the
 * map is from affine.
 * <p>May use: EJML. Must not use: other rooms of ours. Held by {@code WallsTest}.
 */
package org.wispwright.warp.spline;
