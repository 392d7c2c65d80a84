/** Room: proofs for volume files against published bytes. */
package org.wispwright.render.volume;
