/**
 * Room: putting files on disk so that a reader finds a whole one or none.
 * <p>Door: {@link org.wispwright.render.files.WholeFile}.
 * <p>Words: <i>whole</i> = written elsewhere first, then moved into place in one step.
 * <p>May use: nothing of ours. Held by {@code WallsTest}.
 */
package org.wispwright.render.files;
