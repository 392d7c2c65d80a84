/** Room: proofs for cameras against pinhole geometry. */
package org.wispwright.render.view;
