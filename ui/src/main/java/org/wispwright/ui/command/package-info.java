/**
 * Room: the command line. Each command is a thin shell: it reads options, calls a class of {@code ui.job}, and says what
 * came out, in words or as JSON.
 * <p>Door: {@link org.wispwright.ui.command.Main}. Exit codes: {@link org.wispwright.ui.command.ExitCodes}.
 * <p>Words: <i>manner</i> = how a command speaks ({@code --json}, {@code --verbose}).
 * <p>May use: work, shot, report, picocli, Jackson. Must not use: java.awt, javax.swing. Held by {@code WallsTest}.
 */
package org.wispwright.ui.command;
