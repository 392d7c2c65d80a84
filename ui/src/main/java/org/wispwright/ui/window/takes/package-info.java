/** Room: the takes, and the solve that runs. Door: {@link org.wispwright.ui.window.takes.TakesPanel}. */
package org.wispwright.ui.window.takes;
