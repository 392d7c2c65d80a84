package org.wispwright.warp.retouch;

import java.util.Optional;
import java.util.function.UnaryOperator;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;

/** One step of a {@link Retouch}. It changes nothing itself; {@code Retoucher} applies it to a picture. */
public sealed interface Operation permits Stroke, MeshWarp, OutlineWarp, Repaint {
    /** Where the operation may act; empty means anywhere. */
    Optional<Matte> within();

    /** True if the operation leaves every picture as it is, bit for bit. */
    boolean changesNothing();

    /**
     * The operation with every position of its own, and of its matte, taken to another place; radii and strengths stay. The one place
     * that knows all positions of a kind.
     *
     * @throws IllegalArgumentException if what comes out is no such operation, as where all positions fall together
     */
    Operation moved(UnaryOperator<Point> map);
}
