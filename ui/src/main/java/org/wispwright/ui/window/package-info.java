/**
 * Room: the desk's window, in Swing. It draws {@link org.wispwright.ui.desk.DeskState} and hands what a person does to
 * {@link org.wispwright.ui.desk.Desk}; no mathematics, file or long work here. Parts: easel (the picture), notes, ribbon (frames), takes,
 * start (beginnings).
 * <p>Doors: {@link DeskWindow} (the frame), {@link ActionTable} (everything that can be done, with its keys), {@link Words} (every
 * sentence on screen), {@link Palette} (every colour that is ours).
 * <p>May use: desk and all below it. Must not be used by any other room but command. Held by {@code WallsTest}.
 */
package org.wispwright.ui.window;
