/**
 * Room: the one contract test that states what every differentiable operator owes. Shared with warp and optimize.
 */
package org.wispwright.render.contract;
