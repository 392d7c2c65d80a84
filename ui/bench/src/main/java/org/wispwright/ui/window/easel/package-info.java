/** Benchmarks of the easel, beside it so that they see what it shows. */
package org.wispwright.ui.window.easel;
