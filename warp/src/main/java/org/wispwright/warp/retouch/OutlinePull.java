package org.wispwright.warp.retouch;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.outline.Loop;
import org.wispwright.warp.outline.Outlines;

/**
 * An {@link OutlineWarp} brought onto one picture's outline: handles, and the mask that keeps it local.
 * <p>Handles: the drags u_k, each from the outline's nearest point s_k; along the outline a quarter of a reach apart, but never closer to
 * each other or to an s_k than an eighth: at b within a reach of some s_k, moved by {@code sum phi_k u_k / max(1, sum phi_k)},
 * {@code phi_k = s^2 (3 - 2 s)}, {@code s = 1 - |b - s_k| / reach}; pins where b is 1 to {@value #FAR} reaches from what the drags
 * sweep; pins at the corners of the box {@value #FAR} reaches around the drags. Mask: 1 up to one reach from what
 * the drags sweep, falling to 0 at two by {@code s^2 (3 - 2 s)}. Ours.
 */
record OutlinePull(List<Handle> handles, float[] mask, Box box) {
    private static final double FAR = 2.5;
    private static final int MOST_HANDLES = 300;

    static OutlinePull of(OutlineWarp warp, Picture original) {
        Outlines outlines = Outlines.of(original, warp.level());
        List<Handle> handles = new ArrayList<>();
        for (Handle drag : warp.drags()) {
            Point start = outlines.nearest(drag.from().x(), drag.from().y(), warp.reach()).map(p -> new Point(p.x(), p.y()))
                    .orElse(drag.from());
            Point end = new Point(start.x() + drag.to().x() - drag.from().x(), start.y() + drag.to().y() - drag.from().y());
            // Two drags of neighbouring points may find the same place on a coarser picture: the first has it.
            if (handles.stream().allMatch(h -> h.from().distanceTo(start) > MeshWarp.CLOSEST
                    && h.to().distanceTo(end) > MeshWarp.CLOSEST)) {
                handles.add(new Handle(start, end));
            }
        }
        OutlineWarp found = new OutlineWarp(warp.level(), handles, warp.reach(), warp.inside(), Optional.empty());
        Box box = new Box(Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, Double.NEGATIVE_INFINITY);
        for (Handle handle : List.copyOf(handles)) {
            box = box.with(handle.from()).with(handle.to());
        }
        box = box.grown(FAR * warp.reach());
        handles.add(Handle.pin(new Point(box.left(), box.top())));
        handles.add(Handle.pin(new Point(box.right(), box.top())));
        handles.add(Handle.pin(new Point(box.left(), box.bottom())));
        handles.add(Handle.pin(new Point(box.right(), box.bottom())));
        for (Loop loop : outlines.loops()) {
            follow(loop, found, handles);
        }
        return new OutlinePull(handles, mask(found, original), box);
    }

    /** Walks the loop from its point nearest to the first drag, so that handles sit alike at every raster. */
    private static void follow(Loop loop, OutlineWarp warp, List<Handle> handles) {
        double spacing = warp.reach() / 4;
        Loop.Place start = loop.nearest(warp.drags().get(0).from().x(), warp.drags().get(0).from().y());
        double length = loop.length();
        int count = (int) Math.max(1, Math.min(20_000, Math.round(length / spacing)));
        double[] place = new double[2];
        for (int n = 0; n < count && handles.size() < MOST_HANDLES; n++) {
            loop.along(start, length * n / count, place);
            Point from = new Point(place[0], place[1]);
            Point to = followed(from, warp);
            double distance = warp.distance(place[0], place[1]);
            boolean takesPart = to != from || distance >= warp.reach() && distance <= FAR * warp.reach();
            if (takesPart && handles.stream().allMatch(h -> h.from().distanceTo(from) > spacing / 2
                    && h.to().distanceTo(to) > spacing / 8)) {
                handles.add(new Handle(from, to));
            }
        }
    }

    /** Where a point of the outline goes; itself, the very object, if it is beyond every drag's reach. */
    private static Point followed(Point from, OutlineWarp warp) {
        double all = 0;
        double x = 0;
        double y = 0;
        for (Handle drag : warp.drags()) {
            double phi = Sweep.smooth(1 - from.distanceTo(drag.from()) / warp.reach());
            all += phi;
            x += phi * (drag.to().x() - drag.from().x());
            y += phi * (drag.to().y() - drag.from().y());
        }
        return all == 0 ? from : new Point(from.x() + x / Math.max(1, all), from.y() + y / Math.max(1, all));
    }

    private static float[] mask(OutlineWarp warp, Picture original) {
        int width = original.width();
        int height = original.height();
        float[] mask = new float[width * height];
        for (int p = 0; p < mask.length; p++) {
            double distance = warp.distance((p % width + 0.5) / height, (p / width + 0.5) / height);
            mask[p] = (float) Sweep.smooth(2 - distance / warp.reach());
        }
        return mask;
    }
}
