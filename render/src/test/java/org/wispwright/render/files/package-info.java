/** Room: proofs that files appear whole or not at all. */
package org.wispwright.render.files;
