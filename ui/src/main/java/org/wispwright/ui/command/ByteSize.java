package org.wispwright.ui.command;

import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.wispwright.ui.shot.MemoryNeed;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.TypeConversionException;

/**
 * A number of bytes as a person writes it: {@code 2G}, {@code 512M}, {@code 1.5g}, {@code 800000K}; the letters count in
 * steps of 1024. A bare number is bytes.
 *
 * @param bytes 1 MiB or more
 */
public record ByteSize(long bytes) {
    private static final long LEAST = 1L << 20;
    private static final Pattern FORM = Pattern.compile("([0-9]{1,15}(?:\\.[0-9]{1,6})?)\\s*([KMGT]?)(?:I?B)?", Pattern.CASE_INSENSITIVE);

    /** Checks the size. @throws IllegalArgumentException below 1 MiB */
    public ByteSize {
        if (bytes < LEAST) {
            throw new IllegalArgumentException("a size of " + bytes + " bytes is below the least of 1M");
        }
    }

    /** Reads the form above. @throws IllegalArgumentException saying what is needed */
    public static ByteSize parse(String text) {
        Matcher form = FORM.matcher(text.strip());
        if (!form.matches()) {
            throw new IllegalArgumentException("'" + text + "' is not a size; write for example 2G or 512M");
        }
        int shift = form.group(2).isEmpty() ? 0 : 10 * (1 + "KMGT".indexOf(Character.toUpperCase(form.group(2).charAt(0))));
        double bytes = Double.parseDouble(form.group(1)) * (1L << shift);
        if (bytes > 1L << 50) {
            throw new IllegalArgumentException("'" + text + "' is more than the most of 1024T");
        }
        return new ByteSize((long) bytes);
    }

    /** "2.0 GiB", for messages. */
    public String inWords() {
        return MemoryNeed.inWords(bytes);
    }

    /** For picocli: a bad size is wrong usage. */
    public static final class Converter implements ITypeConverter<ByteSize> {
        @Override
        public ByteSize convert(String value) {
            try {
                return parse(value);
            } catch (IllegalArgumentException bad) {
                throw new TypeConversionException(bad.getMessage());
            }
        }
    }
}
