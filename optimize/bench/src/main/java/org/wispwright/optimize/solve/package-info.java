/**
 * Room: figures of whole gradients that need the solve's own, closed classes.
 */
package org.wispwright.optimize.solve;
