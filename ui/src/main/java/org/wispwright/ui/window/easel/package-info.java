/**
 * Room: the picture, and what the hand does to it.
 * <p>Doors: {@link org.wispwright.ui.window.easel.EaselPanel} (all of it), {@link org.wispwright.ui.window.easel.HandStrip} (which hand, and
 * its settings). A hand on the picture is a tool; it makes gestures of {@link org.wispwright.ui.desk.Retouching} from the pointer, which
 * may be the mouse's or the keyboard's.
 * <p>Words: <i>hand</i> = what the pointer does; <i>live picture</i> = the note's wish while a hand changes it; <i>overlay</i> = what a tool
 * draws over the picture.
 * <p>Pressure: Swing tells none of a tablet's, so a pointer's is always 1; strokes, notes and the solve know pressure all the same.
 */
package org.wispwright.ui.window.easel;
