package org.wispwright.ui.job;

/**
 * Where a solve begins.
 *
 * @param kind how
 * @param take the take to go on from; only with {@link Kind#TAKE}
 */
public record Beginning(Kind kind, int take) {
    /** At no force, unless an unfinished solve is there: then it is refused, so that nothing is lost unasked. */
    public static final Beginning FRESH = new Beginning(Kind.FRESH, -1);
    /** At no force; what an unfinished solve left is dropped. */
    public static final Beginning ANEW = new Beginning(Kind.ANEW, -1);
    /** Where an unfinished solve stood. */
    public static final Beginning RESUME = new Beginning(Kind.RESUME, -1);

    /** The ways to begin. */
    public enum Kind {
        /** See {@link Beginning#FRESH}. */ FRESH,
        /** See {@link Beginning#ANEW}. */ ANEW,
        /** See {@link Beginning#RESUME}. */ RESUME,
        /** Where the search of a take ended. */ TAKE
    }

    /** Where the search of a take ended. */
    public static Beginning from(int take) {
        return new Beginning(Kind.TAKE, take);
    }
}
