package org.wispwright.ui.window.easel;

import java.util.Locale;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.ui.window.Words;

/** The tool of each hand. */
final class Tools {
    private Tools() {
    }

    /** A new tool; the one before must have been left. */
    static Tool of(Hand hand, Desk desk, Retouching retouching, Surface surface) {
        if (hand instanceof Hand.Brushing) {
            return new BrushTool(desk, retouching, surface);
        }
        if (hand instanceof Hand.Pulling) {
            return new PullTool(desk, retouching, surface);
        }
        if (hand instanceof Hand.Outlining) {
            return new OutlineTool(desk, retouching, surface);
        }
        return hand instanceof Hand.Holding ? new HoldTool(desk, retouching, surface) : new LookTool();
    }

    /** What an edit is called in undo and redo. */
    static String inWords(Retouching.Edit edit) {
        return Words.of("edit." + edit.name().toLowerCase(Locale.ROOT).replace('_', '-'));
    }

    /** True if one tool serves both hands: settings alone differ, which tools ask the desk for. */
    static boolean areOne(Hand a, Hand b) {
        return a.getClass() == b.getClass();
    }
}
