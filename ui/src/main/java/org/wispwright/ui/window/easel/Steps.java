package org.wispwright.ui.window.easel;

import java.util.ArrayList;
import java.util.List;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.Stroke;

/** The operations of a retouch as a list that can be read and put in another order. */
final class Steps {
    private Steps() {
    }

    /** One line for an operation. */
    static String inWords(Operation operation) {
        if (operation instanceof Stroke stroke) {
            return Words.of("step.stroke", HandKind.valueOf(stroke.brush().name()).inWords(), stroke.line().size());
        }
        if (operation instanceof MeshWarp warp) {
            return Words.of("step.mesh", warp.handles().size(), HandSettings.inWords(warp.kind()));
        }
        if (operation instanceof OutlineWarp warp) {
            return Words.of("step.outline", warp.drags().size(), Math.round(100 * warp.level()));
        }
        return Words.of("step.painted");
    }

    /** Without one of them. */
    static List<Operation> without(List<Operation> operations, int at) {
        List<Operation> fewer = new ArrayList<>(operations);
        fewer.remove(at);
        return fewer;
    }

    /** One of them in the place of another, those between moved up. */
    static List<Operation> moved(List<Operation> operations, int from, int to) {
        List<Operation> changed = new ArrayList<>(operations);
        changed.add(to, changed.remove(from));
        return changed;
    }
}
