package org.wispwright.ui.desk;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.function.Consumer;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.LiveWarp;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Retoucher;

/** Mesh warps made ready to be dragged, on a worker, because a mesh takes a while to set up. Keeps the last one until it is taken. */
final class LiveWarps {
    private final Replacing making;
    private Made kept;
    private Wanted asked;

    /** What a live warp is of. @param before operations before it @param original which they work on, compared by identity */
    private record Wanted(Picture original, List<Operation> before, MeshWarp warp) {
        boolean is(Wanted other) {
            return other != null && original == other.original && before.equals(other.before) && warp.equals(other.warp);
        }
    }

    private record Made(Wanted of, LiveWarp live) {
    }

    LiveWarps(Workers workers, ExecutorService lane) {
        making = new Replacing(workers, lane);
    }

    /** Makes one ready ahead of need. What is refused then is refused again when it is needed. */
    void prepare(Picture original, List<Operation> before, MeshWarp warp) {
        Wanted wanted = new Wanted(original, before, warp);
        if (wanted.is(asked)) {
            return;
        }
        asked = wanted;
        kept = null;
        making.replace(cancel -> made(wanted, Optional.empty()), made -> kept = made, refused -> asked = null);
    }

    /**
     * Gives one away, at once if it is ready.
     *
     * @param fresh a place, after the warp, for one more handle, which leaves the picture as it is
     * @param then  told on the desk's thread
     */
    void take(Picture original, List<Operation> before, MeshWarp warp, Optional<Point> fresh, Consumer<LiveWarp> then,
              Consumer<RuntimeException> failed) {
        Wanted wanted = new Wanted(original, before, warp);
        Made there = kept;
        kept = null;
        asked = null;
        if (there != null && wanted.is(there.of()) && fresh.isEmpty()) {
            making.drop();
            then.accept(there.live());
        } else {
            making.replace(cancel -> made(wanted, fresh), made -> then.accept(made.live()), failed);
        }
    }

    /** Forgets all. */
    void drop() {
        making.drop();
        kept = null;
        asked = null;
    }

    private static Made made(Wanted wanted, Optional<Point> fresh) {
        Picture before = Retoucher.wanted(new Retouch(wanted.before()), wanted.original());
        LiveWarp live = new LiveWarp(wanted.warp(), before, wanted.original());
        if (fresh.isPresent()) {
            List<Handle> handles = new ArrayList<>(wanted.warp().handles());
            handles.add(new Handle(live.cameFrom(fresh.get()).orElse(fresh.get()), fresh.get()));
            live = new LiveWarp(new MeshWarp(wanted.warp().kind(), handles, wanted.warp().cells(), wanted.warp().within()), before,
                    wanted.original());
        }
        return new Made(wanted, live);
    }
}
