/** Room: beginnings: open a shot, make one, try the sample. Door: {@link org.wispwright.ui.window.start.StartPanel}. */
package org.wispwright.ui.window.start;
