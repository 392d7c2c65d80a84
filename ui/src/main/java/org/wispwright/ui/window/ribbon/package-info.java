/** Room: the frames along the range. Door: {@link org.wispwright.ui.window.ribbon.RibbonPanel}. */
package org.wispwright.ui.window.ribbon;
