package org.wispwright.ui.command;

import java.util.List;
import org.wispwright.optimize.solve.StopRule;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.TypeConversionException;

/**
 * One reason to end a solve early, as written on the command line.
 *
 * @param rule the rule with only this reason in it
 */
record Until(StopRule rule) {

    /** All reasons in one rule: the strictest of each kind. */
    static StopRule all(List<Until> reasons) {
        StopRule all = StopRule.OWN;
        for (Until reason : reasons) {
            StopRule r = reason.rule();
            all = new StopRule(Math.max(all.loss(), r.loss()), Math.min(all.seconds(), r.seconds()),
                    Math.min(all.iterations(), r.iterations()));
        }
        return all;
    }

    /** For picocli: anything else is wrong usage. */
    static final class Converter implements ITypeConverter<Until> {
        @Override
        public Until convert(String value) {
            String[] parts = value.split("=", 2);
            try {
                StopRule own = StopRule.OWN;
                return new Until(switch (parts[0]) {
                    case "loss" -> new StopRule(number(parts), own.seconds(), own.iterations());
                    case "seconds" -> new StopRule(own.loss(), number(parts), own.iterations());
                    case "iterations" -> new StopRule(own.loss(), own.seconds(), whole(parts));
                    default -> throw new TypeConversionException("'" + value + "' is none of loss=N, seconds=N, iterations=N");
                });
            } catch (IllegalArgumentException bad) {
                throw new TypeConversionException("'" + value + "': " + bad.getMessage());
            }
        }

        private static double number(String[] parts) {
            if (parts.length < 2 || !parts[1].matches("[0-9]{1,12}(\\.[0-9]{1,12})?")) {
                throw new TypeConversionException("'" + String.join("=", parts) + "' has no number; write for example " + parts[0]
                        + "=0.5");
            }
            return Double.parseDouble(parts[1]);
        }

        private static int whole(String[] parts) {
            if (parts.length < 2 || !parts[1].matches("[0-9]{1,9}")) {
                throw new TypeConversionException("'" + String.join("=", parts) + "' has no whole number; write for example " + parts[0]
                        + "=40");
            }
            return Integer.parseInt(parts[1]);
        }
    }
}
