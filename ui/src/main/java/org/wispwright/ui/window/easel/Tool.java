package org.wispwright.ui.window.easel;

import java.awt.Cursor;
import java.awt.Graphics2D;

/**
 * What a hand does with the pointer over the easel. Made when the hand is taken up, put down by {@link #leave}. Swing's thread; each call
 * must return within some milliseconds.
 */
interface Tool {
    /** The pointer went over the picture with no button down. */
    default void moved(Pointer at) {
    }

    /** The left button went down. */
    default void pressed(Pointer at) {
    }

    /** The pointer moved with the left button down. */
    default void dragged(Pointer at) {
    }

    /** The left button came up. */
    default void released(Pointer at) {
    }

    /** The pointer left the easel. */
    default void exited() {
    }

    /** What was begun and not ended, such as half a stroke, is dropped. Escape does it. */
    default void cancel() {
    }

    /** The hand is put down. */
    default void leave() {
        cancel();
    }

    /** Draws cursor, handles and regions over the picture. */
    default void paint(Graphics2D g, Placement placement) {
    }

    /** The pointer's form; null for the usual. */
    default Cursor cursor() {
        return null;
    }
}
