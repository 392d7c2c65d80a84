/**
 * Room: the jobs that a command or a window starts, free of both: each takes checked values, tells its progress, stops
 * when asked, and leaves whole files or none.
 * <p>Doors: the classes named {@code ...Work}; {@link org.wispwright.ui.job.Progress} and
 * {@link org.wispwright.ui.job.Cancel} (what a job is given), {@link org.wispwright.ui.job.Build} (which program this is).
 * <p>May use: shot, report, render, warp, optimize. Must not use: command, picocli, javax.swing. Held by {@code WallsTest}.
 */
package org.wispwright.ui.job;
