package org.wispwright.ui.window.easel;

import java.util.Locale;
import java.util.Optional;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.WarpKind;

/** The hands in the order of their buttons, each with its key. */
enum HandKind {
    LOOK("1"), ADD("2"), REMOVE("3"), SOFTEN("4"), PUSH("5"), PULL("6"), OUTLINE("7"), HOLD("8"), EVEN("9"), LIFT("0"), RESTORE("shift 0");

    private final String key;

    HandKind(String key) {
        this.key = key;
    }

    /** Its key, as Swing writes it. */
    String key() {
        return key;
    }

    /** The id of the action that takes it up. */
    String id() {
        return "hand." + word();
    }

    String word() {
        return name().toLowerCase(Locale.ROOT);
    }

    /** What it is called. */
    String inWords() {
        return Words.of("action." + id());
    }

    /** What it does, and its key. */
    String tip() {
        return Words.of("action." + id() + ".tip") + "  (" + key.replace("shift ", Words.of("hand.shift") + "+") + ")";
    }

    /** The brush, if it is one. */
    Optional<Brush> brush() {
        return switch (this) {
            case LOOK, PULL, OUTLINE, HOLD -> Optional.empty();
            default -> Optional.of(Brush.valueOf(name()));
        };
    }

    /** As it lies ready at the beginning. */
    Hand usual() {
        return switch (this) {
            case LOOK -> Hand.LOOK;
            case PULL -> new Hand.Pulling(WarpKind.AS_RIGID_AS_POSSIBLE);
            case OUTLINE -> new Hand.Outlining(0.3, 0.2);
            case HOLD -> new Hand.Holding(Hand.Form.RECTANGLE, 0.04);
            default -> Hand.Brushing.usual(brush().orElseThrow());
        };
    }

    /** The kind of a hand. */
    static HandKind of(Hand hand) {
        if (hand instanceof Hand.Brushing brushing) {
            return valueOf(brushing.brush().name());
        }
        return hand instanceof Hand.Pulling ? PULL : hand instanceof Hand.Outlining ? OUTLINE : hand instanceof Hand.Holding ? HOLD : LOOK;
    }
}
