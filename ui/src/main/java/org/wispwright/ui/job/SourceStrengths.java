package org.wispwright.ui.job;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.Source;
import org.wispwright.ui.shot.TakeRecord;

/** The strengths that a solve gave the sources, for people and for other programs. */
public final class SourceStrengths {
    private SourceStrengths() {
    }

    /** As a take's {@code sources.json} has them: for each source a number a frame that it feeds, 1 for as it was set up. */
    static ObjectNode json(FlowSetup flow, double[][] strengths) {
        ObjectNode top = TakeRecord.object().put("wispwright", 1);
        ArrayNode list = top.putArray("sources");
        for (int n = 0; n < flow.sources().size(); n++) {
            int[] frames = fed(flow, n);
            ObjectNode source = list.addObject().put("name", flow.sources().get(n).name());
            if (frames.length > 0) {
                source.putArray("frames").add(frames[0]).add(frames[frames.length - 1]);
            }
            ArrayNode values = source.putArray("strength");
            for (int frame : frames) {
                values.add(strengths[frame - flow.frames().first() - 1][n]);
            }
        }
        return top;
    }

    /** Mean, least and most of each source over the frames that it feeds. */
    static ArrayNode figures(FlowSetup flow, double[][] strengths) {
        ArrayNode list = TakeRecord.object().putArray("sources");
        for (int n = 0; n < flow.sources().size(); n++) {
            double[] values = values(flow, strengths, n);
            list.addObject().put("name", flow.sources().get(n).name()).put("mean", Arrays.stream(values).average().orElse(1))
                    .put("least", Arrays.stream(values).min().orElse(1)).put("most", Arrays.stream(values).max().orElse(1));
        }
        return list;
    }

    /** One line a source. */
    public static List<String> inWords(FlowSetup flow, double[][] strengths) {
        List<String> lines = new ArrayList<>();
        for (int n = 0; n < flow.sources().size(); n++) {
            double[] values = values(flow, strengths, n);
            lines.add(String.format(Locale.ROOT, "source '%s' gives %.2f times its rate (%.2f to %.2f over its frames)",
                    flow.sources().get(n).name(),
                    Arrays.stream(values).average().orElse(1), Arrays.stream(values).min().orElse(1),
                            Arrays.stream(values).max().orElse(1)));
        }
        return lines;
    }

    private static double[] values(FlowSetup flow, double[][] strengths, int n) {
        return Arrays.stream(fed(flow, n)).mapToDouble(frame -> strengths[frame - flow.frames().first() - 1][n]).toArray();
    }

    /** Frames of the shot, after its first, that a source feeds. */
    private static int[] fed(FlowSetup flow, int n) {
        Source source = flow.sources().get(n);
        return IntStream.rangeClosed(flow.frames().first() + 1, flow.frames().last()).filter(source::feeds).toArray();
    }
}
