/** Room: proofs for colour, compositing and picture files against published numbers. */
package org.wispwright.render.picture;
