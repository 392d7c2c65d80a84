/**
 * Room: what the desk knows and does, free of any screen. An artist's whole session is one immutable {@link DeskState}; everything that
 * happens is a small function from one state to the next.
 * <p>Doors: {@link Desk} (the session: open, look, edit, undo, redo; told to listeners), {@link Pictures} (pictures of takes and
 * wishes, drawn beside the work), {@link Retouching} (the open note's retouch under a hand, with {@link Drawing}, {@link Pulling} and
 * {@link OutlineDrag}), {@link Solving} (the solve that runs and what comes before one; {@link TakeWork} says how it goes),
 * {@link WritingOut} (takes for others), {@link Workers} (where work runs, and where its results come back).
 * <p>Words: <i>look</i> = a change that only concerns what is shown; <i>edit</i> = a change of the shot, with a name, undoable and
 * written at once by the {@link Keeper}; <i>source</i> = what a picture is of: a take, a note's wish, a rendered frame; <i>desk's thread</i> =
 * the one thread that may call a {@link Desk}.
 * <p>May use: shot, job, report, warp, optimize, render. Must not use: command, window, javax.swing, java.awt. Held by {@code WallsTest}.
 */
package org.wispwright.ui.desk;
