/**
 * Room: doing numbered pieces of work on several threads so that the result has the same bits for any count.
 * <p>Door: {@link org.wispwright.render.lanes.Lanes}.
 * <p>Words: <i>lane</i> = one thread that takes pieces; <i>piece</i> = a slab, row or anything else with a number.
 * <p>May use: nothing. Held by {@code WallsTest}.
 */
package org.wispwright.render.lanes;
