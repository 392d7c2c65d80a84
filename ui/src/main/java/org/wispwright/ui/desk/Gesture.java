package org.wispwright.ui.desk;

/** What a hand has begun on the open note and not ended. At most one at a time. */
abstract sealed class Gesture permits Drawing, Pulling, OutlineDrag {
    /** What it works on is there. */
    abstract void ready();

    /** It is dropped: what it drew on the session's canvas goes, and nothing that comes later is heard. */
    abstract void dropped();
}
