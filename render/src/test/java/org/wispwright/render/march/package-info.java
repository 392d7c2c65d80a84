/** Room: proofs for the ray march: published integrals, the pullback contract, slow twins in double. */
package org.wispwright.render.march;
