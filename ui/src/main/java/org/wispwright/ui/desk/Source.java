package org.wispwright.ui.desk;

/** What a picture on the easel is of. */
public sealed interface Source {
    /** The original. */
    Source ORIGINAL = new Take(0);

    /** A take. @param number 0 for the original */
    record Take(int number) implements Source {
        /** Checks the number. */
        public Take {
            if (number < 0) {
                throw new IllegalArgumentException("take: got number " + number + ", needs 0 or more");
            }
        }
    }

    /** What a note's retouch makes of the original, on the note's own frame and in its view. @param note its id */
    record Wanted(String note) implements Source {
    }

    /** The frame that the production renderer made, where the shot has one. */
    record Rendered() implements Source {
    }
}
