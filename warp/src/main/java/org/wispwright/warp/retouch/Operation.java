package org.wispwright.warp.retouch;

import java.util.Optional;
import org.wispwright.warp.matte.Matte;

/** One step of a {@link Retouch}. It changes nothing itself; {@code Retoucher} applies it to a picture. */
public sealed interface Operation permits Stroke, MeshWarp, OutlineWarp, Repaint {
    /** Where the operation may act; empty means anywhere. */
    Optional<Matte> within();

    /** True if the operation leaves every picture as it is, bit for bit. */
    boolean changesNothing();
}
