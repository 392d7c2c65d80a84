package org.wispwright.ui.command;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.SerializationFeature;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.PrintWriter;
import org.wispwright.ui.job.Cancel;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/**
 * How a command speaks: results on standard output, in words or as one JSON object; progress and complaints on standard
 * error. Mixed into every command.
 */
final class Manner {
    private static final ObjectMapper JSON = JsonMapper.builder().enable(SerializationFeature.INDENT_OUTPUT).build();

    @Option(names = "--json", description = "Print the result as one JSON object on standard output, for other programs.")
    private boolean json;

    @Option(names = "--verbose", description = "Show where in the program an error came from.")
    private boolean verbose;

    @Option(names = {"-h", "--help"}, usageHelp = true, description = "Show this help and end.")
    private boolean help;

    @Spec(Spec.Target.MIXEE)
    private CommandSpec spec;

    boolean verbose() {
        return verbose;
    }

    boolean json() {
        return json;
    }

    /** A fresh JSON object. */
    static ObjectNode object() {
        return JSON.createObjectNode();
    }

    /** Says the result: the words, or with {@code --json} the object. */
    void say(String words, ObjectNode object) {
        PrintWriter out = spec.commandLine().getOut();
        out.println(json ? text(object) : words);
        out.flush();
    }

    /** One JSON object as text. */
    static String text(ObjectNode object) {
        try {
            return JSON.writeValueAsString(object);
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException(impossible);
        }
    }

    /** Where this command's progress goes: one updating line on a terminal, plain lines in a pipe. */
    ProgressLine progress() {
        return ProgressLine.to(spec.commandLine().getErr(), System.console() != null);
    }

    /** The wish to stop that Ctrl-C makes. */
    Cancel cancel() {
        return ((Main) spec.root().userObject()).cancel();
    }
}
