package org.wispwright.ui.desk;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.ShotException;

/** Frames as a person writes them: {@code 1030, 1034-1040}. */
public final class FrameList {
    private FrameList() {
    }

    /**
     * Reads frames.
     *
     * @param text  numbers and spans with commas or spaces between
     * @param every of a span, only every such frame, from its first on; above 0
     * @param range of the shot; its first frame, which no force can change, is refused like one outside
     * @return each once, lowest first, at least one
     * @throws ShotException in one sentence that says what is wrong
     */
    public static List<Integer> parse(String text, int every, FrameRange range) {
        TreeSet<Integer> frames = new TreeSet<>();
        for (String part : text.trim().split("[,\\s]+")) {
            if (!part.matches("[0-9]{1,9}(-[0-9]{1,9})?")) {
                throw fault("'" + part + "'", "frames such as 1030, 1034-1040", "write numbers with commas between");
            }
            String[] ends = part.split("-");
            int first = require(ends[0], range);
            int last = require(ends[ends.length - 1], range);
            if (last < first) {
                throw fault("'" + part + "'", "the earlier frame first", "turn it round");
            }
            for (int frame = first; frame <= last; frame += every) {
                frames.add(frame);
            }
        }
        return new ArrayList<>(frames);
    }

    private static int require(String text, FrameRange range) {
        int frame = Integer.parseInt(text);
        if (!range.contains(frame) || frame == range.first()) {
            throw fault("frame " + frame, "frames " + (range.first() + 1) + " to " + range.last() + ", which a force can change",
                    "leave it out");
        }
        return frame;
    }

    private static ShotException fault(String found, String needed, String wayOut) {
        return new ShotException(Finding.of("frames", "", found, needed, wayOut));
    }
}
