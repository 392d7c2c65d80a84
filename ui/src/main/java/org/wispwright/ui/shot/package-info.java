/**
 * Room: the shot folder on disk, read strictly and written whole or not at all.
 * <p>Doors: {@link org.wispwright.ui.shot.ShotFolder} (a folder and the paths inside it),
 * {@link org.wispwright.ui.shot.JsonDoor} (a JSON file as a {@link org.wispwright.ui.shot.JsonPlace}),
 * {@link org.wispwright.ui.shot.NoteEdits} (changes to notes, and taking them back).
 * <p>Words: <i>place</i> = one value of a JSON file together with where it stands; <i>finding</i> = one sentence about
 * what is wrong; <i>pointer</i> = where in a file, as in RFC 6901.
 * <p>May use: render, warp, optimize, Jackson. Must not use: picocli, java.awt, javax.swing. Held by {@code WallsTest}.
 */
package org.wispwright.ui.shot;
