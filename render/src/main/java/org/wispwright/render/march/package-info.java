/**
 * Room: rays through a {@link org.wispwright.render.volume.ScalarGrid}, and gradients back to its cells.
 * <p>Doors: {@link org.wispwright.render.march.RayMarcher} (density to picture and back),
 * {@link org.wispwright.render.march.LightSweep} (density to light that arrives),
 * {@link org.wispwright.render.march.VelocityOfPicture} (density and velocity to motion across the picture),
 * {@link org.wispwright.render.march.Look} (how density becomes light).
 * <p>Words: <i>step</i> = metres between samples; <i>xBar</i> = derivative of the loss by x; <i>tau</i> = extinction times
 * density times metres. See Max (1995), IEEE TVCG 1(2), 99-108.
 * <p>May use: volume, view, picture, lanes. Held by {@code WallsTest}.
 */
package org.wispwright.render.march;
