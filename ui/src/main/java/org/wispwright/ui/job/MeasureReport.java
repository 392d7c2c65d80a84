package org.wispwright.ui.job;

import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Locale;
import java.util.Map;
import org.wispwright.optimize.flow.Clock;
import org.wispwright.optimize.solve.Measurement;
import org.wispwright.ui.shot.MemoryNeed;

/** What a measurement says, for people and for programs. */
public final class MeasureReport {
    private MeasureReport() {
    }

    /** For programs; shares of 1. */
    public static ObjectNode of(Measurement m) {
        ObjectNode top = JsonNodeFactory.instance.objectNode().put("cells", m.grid().inWords()).put("frames", m.frames())
                .put("threads", m.threads())
                .put("stepNanosACell", m.stepNanosACell()).put("forwardSeconds", m.forwardSeconds())
                        .put("gradientSeconds", m.gradientSeconds())
                .put("ratio", m.ratio()).put("snapshots", m.snapshots()).put("onDisk", m.onDisk()).put("plainSteps", m.plainSteps())
                        .put("peakMemoryBytes", PeakMemory.bytes());
        shares(top.putObject("forwardShare"), m.forwardShare());
        shares(top.putObject("gradientShare"), m.gradientShare());
        return top;
    }

    /** For people. */
    public static String inWords(Measurement m) {
        StringBuilder words = new StringBuilder();
        words.append(String.format(Locale.ROOT, "%s, %d frames, %d threads%n", m.grid().inWords(), m.frames(), m.threads()));
        words.append(String.format(Locale.ROOT, "one step            %8.1f ns a cell%n", m.stepNanosACell()));
        words.append(String.format(Locale.ROOT, "forward run         %8.3f s%n", m.forwardSeconds()));
        words.append(String.format(Locale.ROOT, "gradient            %8.3f s, %.2f times the forward run, %d states kept%s%n",
                m.gradientSeconds(), m.ratio(), m.snapshots(), m.onDisk() > 0 ? ", " + m.onDisk() + " of them on disk" : ""));
        words.append(String.format(Locale.ROOT, "peak memory         %8s%n", MemoryNeed.inWords(PeakMemory.bytes())));
        words.append(String.format(Locale.ROOT, "share of time       %8s %8s", "forward", "gradient"));
        double forward = total(m.forwardShare());
        double gradient = total(m.gradientShare());
        for (Map.Entry<Clock.Part, Double> part : m.gradientShare().entrySet()) {
            double share = m.forwardShare().getOrDefault(part.getKey(), 0.0);
            words.append(String.format(Locale.ROOT, "%n  %-20s%4.1f %% %6.1f %%", word(part.getKey()), 100 * share / forward,
                    100 * part.getValue() / gradient));
        }
        return words.toString();
    }

    private static void shares(ObjectNode object, Map<Clock.Part, Double> seconds) {
        double total = total(seconds);
        seconds.forEach((part, value) -> object.put(word(part), value / total));
    }

    private static double total(Map<Clock.Part, Double> seconds) {
        return Math.max(1e-12, seconds.values().stream().mapToDouble(Double::doubleValue).sum());
    }

    private static String word(Clock.Part part) {
        return part.name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }
}
