/**
 * Room: pictures that people read: the sheet that shows what was asked, what came out, and what is still apart.
 * <p>Doors: {@link org.wispwright.ui.report.Sheet}, {@link org.wispwright.ui.report.SheetRow}.
 * <p>Words: <i>surround</i> = the neutral grey around pictures; <i>gain</i> = what a difference is multiplied by to be seen;
 * <i>marks</i> = a retouch drawn as lines over a picture.
 * <p>May use: render.picture, warp.retouch, java.awt (off screen), imgscalr. Must not use: command, work, javax.swing. Held
 * by {@code WallsTest}.
 */
package org.wispwright.ui.report;
