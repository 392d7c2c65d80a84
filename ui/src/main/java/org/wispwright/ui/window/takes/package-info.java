/** Room: the takes, the solve that runs or could, and what is written out. Door: {@link org.wispwright.ui.window.takes.TakesPanel}. */
package org.wispwright.ui.window.takes;
