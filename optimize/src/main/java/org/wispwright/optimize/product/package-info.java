/**
 * Room: small dense products over long rows of floats, the one kernel that the pressure transforms and the force share.
 * <p>Door: {@link org.wispwright.optimize.product.RowProduct}.
 * <p>May use: nothing. Held by {@code WallsTest}.
 */
package org.wispwright.optimize.product;
