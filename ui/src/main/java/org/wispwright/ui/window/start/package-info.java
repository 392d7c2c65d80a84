/** Room: beginnings: open a shot, make one, try the sample. Doors: {@link org.wispwright.ui.window.start.StartPanel},
 * {@link org.wispwright.ui.window.start.BeginPanel}. */
package org.wispwright.ui.window.start;
