package org.wispwright.ui.desk;

/**
 * A sentence for the person, with what to do next in it.
 *
 * @param kind  how it is shown
 * @param words one sentence
 */
public record Message(Kind kind, String words) {
    /** What a message is. */
    public enum Kind {
        /** Something was done. */ DONE,
        /** Something to know. */ NOTICE,
        /** Something could not be done. */ FAULT
    }
}
