package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.awt.GraphicsEnvironment;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.job.Build;
import org.wispwright.ui.job.Cancel;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.IVersionProvider;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import picocli.CommandLine.UnmatchedArgumentException;

/** The program: finds the command, runs it, and turns whatever happens into an exit code and at most one sentence. */
@Command(name = "wispwright", versionProvider = Main.Version.class, sortOptions = false,
        description = "Changes a smoke simulation so that it satisfies review notes drawn on its frames.",
        subcommands = {DeskCommand.class, TourCommand.class, SimulateCommand.class, PictureCommand.class, RetouchCommand.class, EstimateCommand.class, SolveCommand.class,
                CompareCommand.class, CheckCommand.class, NoteCommand.class, MeasureCommand.class},
        synopsisSubcommandLabel = "COMMAND",
        footer = {"",
            "Exit codes: 0 done, 1 an error of ours, 2 wrong usage, 3 bad input, 130 stopped by Ctrl-C.",
            "",
            "Examples:",
            "  java -jar wispwright.jar",
            "  java -jar wispwright.jar tour",
            "  java -jar wispwright.jar check samples/kiln-yard",
            "  java -jar wispwright.jar solve samples/kiln-yard",
            "  java -jar wispwright.jar solve --help"})
public final class Main implements Runnable {
    private static final long SECONDS_TO_STOP = 20;

    @Option(names = {"-V", "--version"}, versionHelp = true, description = "Show the version and end.")
    private boolean version;

    @Option(names = {"-h", "--help"}, usageHelp = true, description = "Show this help and end.")
    private boolean help;

    @Spec
    private CommandSpec spec;

    private final Cancel cancel;

    private Main(Cancel cancel) {
        this.cancel = cancel;
    }

    /** Runs the program and ends the process with its exit code. Without a command it opens the desk, where there is a display. */
    public static void main(String[] args) {
        String[] asked = args.length == 0 && !GraphicsEnvironment.isHeadless() ? new String[] {"desk"} : args;
        Cancel cancel = new Cancel();
        CountDownLatch ended = new CountDownLatch(1);
        // Ctrl-C starts the hooks; the process then ends with 130 by itself, once the work has put itself away.
        Runtime.getRuntime().addShutdownHook(new Thread(() -> {
            cancel.wish();
            try {
                ended.await(SECONDS_TO_STOP, TimeUnit.SECONDS);
            } catch (InterruptedException stop) {
                Thread.currentThread().interrupt();
            }
        }, "stop-on-signal"));
        int code = ExitCodes.OURS;
        try {
            code = run(asked, new PrintWriter(System.out, true, StandardCharsets.UTF_8),
                    new PrintWriter(System.err, true, StandardCharsets.UTF_8), cancel);
        } finally {
            ended.countDown();
        }
        System.exit(code);
    }

    /**
     * Runs the program inside this process.
     *
     * @param args as on the command line
     * @param out for results
     * @param err for progress and complaints
     * @param cancel stops the command when wished
     * @return the exit code, see {@link ExitCodes}
     */
    public static int run(String[] args, PrintWriter out, PrintWriter err, Cancel cancel) {
        CommandLine line = new CommandLine(new Main(cancel));
        line.setOut(out);
        line.setErr(err);
        line.setUsageHelpWidth(120);
        line.setExpandAtFiles(false);
        line.setParameterExceptionHandler(Main::wrongUsage);
        line.setExecutionExceptionHandler((thrown, command, parsed) -> ended(thrown, command));
        try {
            return line.execute(args);
        } catch (OutOfMemoryError full) {
            return ended(full, line);
        } finally {
            out.flush();
            err.flush();
        }
    }

    /** Without a command: says what there is. */
    @Override
    public void run() {
        throw new ParameterException(spec.commandLine(), "no command given");
    }

    Cancel cancel() {
        return cancel;
    }

    private static int wrongUsage(ParameterException wrong, String[] args) {
        CommandLine command = wrong.getCommandLine();
        PrintWriter err = command.getErr();
        String sentence = wrong.getMessage().strip();
        if (wrong instanceof UnmatchedArgumentException unmatched && !unmatched.getSuggestions().isEmpty()) {
            sentence += "; did you mean '" + unmatched.getSuggestions().get(0) + "'?";
        }
        err.println("wispwright: " + sentence + (sentence.endsWith("?") || sentence.endsWith(".") ? "" : ".") + " See "
                + command.getCommandSpec().qualifiedName() + " --help.");
        return ExitCodes.USAGE;
    }

    private static int ended(Throwable thrown, CommandLine command) {
        boolean verbose = has(command, "--verbose");
        boolean json = has(command, "--json");
        int code = ExitCodes.OURS;
        String sentence;
        Finding finding = null;
        if (thrown instanceof ShotException bad) {
            code = ExitCodes.BAD_INPUT;
            finding = bad.finding();
            sentence = finding.inWords();
        } else if (thrown instanceof Cancel.Cancelled) {
            code = ExitCodes.CANCELLED;
            sentence = "stopped as asked; nothing was left half done.";
        } else if (thrown instanceof OutOfMemoryError) {
            code = ExitCodes.BAD_INPUT;
            sentence = "the memory of " + Runtime.getRuntime().maxMemory() / (1 << 20)
                    + " MiB is used up; give more with java -Xmx4g -jar wispwright.jar, or take a smaller grid.";
        } else {
            sentence = "this should not have happened: " + thrown
                    + (verbose ? "" : "; run it again with --verbose and report what it shows") + ".";
        }
        command.getErr().println("wispwright: " + sentence.replaceAll("\\s*[\\r\\n]+\\s*", " "));
        if (verbose) {
            thrown.printStackTrace(command.getErr());
        }
        if (json) {
            ObjectNode object = Manner.object().put("ok", false).put("exitCode", code);
            if (finding == null) {
                object.put("message", sentence);
            } else {
                object.putArray("findings").add(CheckCommand.json(finding));
            }
            command.getOut().println(Manner.text(object));
        }
        return code;
    }

    /** True if the option was given to this command or to one under it. */
    private static boolean has(CommandLine command, String option) {
        for (CommandLine.ParseResult at = command.getParseResult(); at != null; at = at.subcommand()) {
            if (at.hasMatchedOption(option)) {
                return true;
            }
        }
        return false;
    }

    /** The build's version for picocli. */
    static final class Version implements IVersionProvider {
        @Override
        public String[] getVersion() {
            return new String[] {"wispwright " + Build.version()};
        }
    }
}
