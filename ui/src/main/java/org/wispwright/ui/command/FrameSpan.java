package org.wispwright.ui.command;

import java.util.List;
import java.util.stream.IntStream;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.TypeConversionException;

/**
 * Frames as written on the command line: {@code 1030-1040}, or one, {@code 1030}.
 *
 * @param first the first
 * @param last the last, not before the first; at most 10 000 frames
 */
record FrameSpan(int first, int last) {
    /** Every so many of them, from the first on. */
    List<Integer> every(int step) {
        return IntStream.iterate(first, frame -> frame <= last, frame -> frame + step).boxed().toList();
    }

    /** For picocli: anything else is wrong usage. */
    static final class Converter implements ITypeConverter<FrameSpan> {
        @Override
        public FrameSpan convert(String value) {
            if (!value.matches("[0-9]{1,8}(-[0-9]{1,8})?")) {
                throw new TypeConversionException("'" + value + "' are no frames; write for example 1030-1040");
            }
            String[] ends = value.split("-");
            int first = Integer.parseInt(ends[0]);
            int last = ends.length == 1 ? first : Integer.parseInt(ends[1]);
            if (last < first || last - first >= 10_000) {
                throw new TypeConversionException("'" + value + "': needs the last frame not before the first and at most 10000 frames");
            }
            return new FrameSpan(first, last);
        }
    }
}
