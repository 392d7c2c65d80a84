/** Room: what made the samples' files. Nothing in the program uses it. */
package org.wispwright.ui.sample;
