package org.wispwright.ui.shot;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Predicate;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.warp.matte.ImageMatte;

/**
 * The PNG files that notes name as mattes, as strict as rendered frames are: inside the shot folder, their stated size within the memory
 * given (all of them together) before any of it is taken, whole. Each file is read once. Not for several threads.
 */
final class MattePictures {
    /** Bytes a pixel that a matte keeps. */
    private static final long KEPT = 4;
    private static final long LONGEST_SIDE = Picture.LONGEST_SIDE;

    private final ShotFolder folder;
    private final long memoryBytes;
    private final Map<String, ImageMatte> read = new HashMap<>();
    private final List<Named> named = new ArrayList<>();
    private long keptPixels;

    /** Where a note names a picture, and what size that has. */
    private record Named(String json, String pointer, String file, RenderedFrame.StatedSize size) {
    }

    /** @param memoryBytes what may be taken in all */
    MattePictures(ShotFolder folder, long memoryBytes) {
        this.folder = folder;
        this.memoryBytes = memoryBytes;
    }

    /**
     * A picture as a matte.
     *
     * @param place the value that names the file
     * @throws ShotException if there is no such file inside the folder, it is too large, no whole PNG picture, or has nothing in the
     * channel
     */
    ImageMatte matte(JsonPlace place, ImageMatte.Channel channel, double feather) {
        String file = ShotFolder.named(place);
        RenderedFrame.StatedSize size = RenderedFrame.statedSize(folder, file, place.file(), place.pointer());
        named.add(new Named(place.file(), place.pointer(), file, size));
        ImageMatte plain = read.get(channel + " " + file);
        if (plain == null) {
            requireRoom(place, file, size);
            Picture picture = RenderedFrame.read(folder, file, place.file(), place.pointer());
            float[] pixels = ImageMatte.pixels(picture, channel);
            if (channel == ImageMatte.Channel.ALPHA && isOpaque(pixels)) {
                throw place.fault("picture '" + file + "', which is opaque everywhere", "one with an alpha channel that says where",
                        "save it with transparency, or take its brightness with \"channel\": \"grey\"");
            }
            plain = new ImageMatte(picture.width(), picture.height(), pixels, 0);
            read.put(channel + " " + file, plain);
            keptPixels += pixels.length;
        }
        return new ImageMatte(plain.width(), plain.height(), plain.pixels(), feather, Optional.of(new ImageMatte.Source(file, channel)));
    }

    private void requireRoom(JsonPlace place, String file, RenderedFrame.StatedSize size) {
        if (size.width() > LONGEST_SIDE || size.height() > LONGEST_SIDE) {
            throw place.fault("picture '" + file + "' of " + size.inWords(), "sides of at most " + LONGEST_SIDE, "make it smaller");
        }
        long need = MemoryNeed.ofPicture(size.width() * size.height()) + KEPT * keptPixels;
        if (need > memoryBytes) {
            throw place.fault("picture '" + file + "' of " + size.inWords() + ", which with the other mattes takes "
                    + MemoryNeed.inWords(need), "pictures that fit into " + MemoryNeed.inWords(memoryBytes),
                    "make it smaller, or " + MemoryNeed.giveMore(need));
        }
    }

    private static boolean isOpaque(float[] pixels) {
        for (float value : pixels) {
            if (value < 1) {
                return false;
            }
        }
        return true;
    }

    /**
     * Refuses, by a finding each, pictures whose aspect is not that of the view.
     *
     * @param json  the file that names them
     * @param where which of its JSON pointers count
     */
    void requireAspect(String json, Predicate<String> where, View view, Findings findings) {
        for (Named picture : named) {
            if (picture.json.equals(json) && where.test(picture.pointer)) {
                findings.check(() -> picture.size.requireAspect(view, picture.file, picture.json, picture.pointer,
                        "draw it over a picture of this view, or correct the view"));
            }
        }
    }
}
