package org.wispwright.ui.command;

import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.TypeConversionException;

/**
 * A number of threads from the command line.
 *
 * @param count 1 to 1024
 */
record ThreadCount(int count) {

    /** For picocli: a bad number is wrong usage. */
    static final class Converter implements ITypeConverter<ThreadCount> {
        @Override
        public ThreadCount convert(String value) {
            if (!value.matches("[0-9]{1,4}") || Integer.parseInt(value) < 1 || Integer.parseInt(value) > 1024) {
                throw new TypeConversionException("'" + value + "' is not a number of threads; give 1 to 1024");
            }
            return new ThreadCount(Integer.parseInt(value));
        }
    }
}
