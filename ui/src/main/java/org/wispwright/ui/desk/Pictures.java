package org.wispwright.ui.desk;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.function.Consumer;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.ScalarGrid;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.PictureWork;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.RenderedFrame;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotView;
import org.wispwright.ui.shot.Takes;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Retoucher;

/**
 * Pictures of the shot on the desk: of takes at any frame, of wishes, of rendered frames. Drawn on a worker, kept while there is room, linear
 * and premultiplied; nobody changes one. What is asked under one name replaces what was asked under it before; a small draft comes
 * first where the whole picture takes long.
 */
public final class Pictures {
    /** Pixels of a draft: so many are drawn within a few frames of the screen. */
    private static final int DRAFT_PIXELS = 50_000;
    /** Samples of drafts lie at most this share of a cell apart. */
    private static final double DRAFT_STEP_CELLS = 1;
    /** Pictures of at most so many rows are drawn apart from the large ones, so that neither waits for the other. */
    private static final int SMALL_ROWS = 200;
    /** How long the hand must rest on a frame before its whole picture is begun. */
    private static final int REST_MILLIS = 120;
    private static final int FEW_PIXELS = 200_000;

    private final Workers workers;
    private final ExecutorService lane;
    private final ExecutorService smallLane;
    private final Map<String, Replacing> asked = new LinkedHashMap<>();
    private final Map<Key, Picture> kept = new LinkedHashMap<>(16, 0.75f, true);
    private final long mostBytes = Runtime.getRuntime().maxMemory() / 4;
    private long bytes;
    private OpenShot shot;

    /**
     * A picture of a source. Two wishes are the same if their retouches are.
     *
     * @param source  what of
     * @param view    the view's name
     * @param frame   the frame
     * @param rows    the picture's height
     * @param step    share of a cell that samples lie apart at most
     * @param retouch of a wish; null for other sources
     */
    private record Key(Source source, String view, int frame, int rows, double step, Retouch retouch) {
    }

    Pictures(Workers workers) {
        this.workers = workers;
        lane = workers.lane("pictures");
        smallLane = workers.lane("thumbnails");
    }

    /** Another shot: what was drawn and asked of the one before is dropped. */
    void of(OpenShot other) {
        asked.values().forEach(Replacing::drop);
        synchronized (kept) {
            shot = other;
            kept.clear();
            bytes = 0;
        }
    }

    /** What is asked of: a source in a view at a frame. @param rows the picture's height, or 0 for the view's own */
    public record Ask(Source source, String view, int frame, int rows) {
    }

    /** Something that came: the picture, and whether it is only a draft. */
    public record Drawn(Picture picture, boolean draft) {
    }

    /**
     * The picture if it is there already.
     *
     * @param now the shot with its notes as they are
     */
    public Optional<Picture> ready(OpenShot now, Ask ask) {
        synchronized (kept) {
            return Optional.ofNullable(kept.get(key(now, ask, PictureWork.STEP_CELLS)));
        }
    }

    /**
     * Has a picture drawn; in place of what was asked under that name before.
     *
     * @param name   who asks
     * @param now    the shot with its notes as they are
     * @param show   on the desk's thread: first of a draft, if it is worth one, then of the whole picture
     * @param failed on the desk's thread: why there is none
     */
    public void ask(String name, OpenShot now, Ask ask, Consumer<Drawn> show, Consumer<String> failed) {
        boolean small = ask.rows() > 0 && ask.rows() <= SMALL_ROWS;
        Replacing mine = asked.computeIfAbsent(name, n -> new Replacing(workers, small ? smallLane : lane));
        Optional<Picture> there = ready(now, ask);
        if (there.isPresent()) {
            mine.drop();
            show.accept(new Drawn(there.get(), false));
            return;
        }
        Ask draft = new Ask(ask.source(), ask.view(), ask.frame(), draftRows(now, ask));
        if (!(ask.source() instanceof Source.Rendered) && pixels(now, ask) > FEW_PIXELS) {
            mine.replace(cancel -> draw(now, draft, DRAFT_STEP_CELLS, cancel), picture -> {
                show.accept(new Drawn(picture, true));
                whole(mine, now, ask, REST_MILLIS, show, failed);
            }, thrown -> failed.accept(Desk.words(thrown)));
        } else {
            whole(mine, now, ask, 0, show, failed);
        }
    }

    private void whole(Replacing mine, OpenShot now, Ask ask, int restMillis, Consumer<Drawn> show, Consumer<String> failed) {
        mine.replace(cancel -> {
            rest(restMillis, cancel);
            return draw(now, ask, cancel);
        }, picture -> show.accept(new Drawn(picture, false)), thrown -> failed.accept(Desk.words(thrown)));
    }

    /** Waits a little, unless something newer is asked: while the hand runs over the frames only drafts are drawn. */
    private static void rest(int millis, Cancel cancel) {
        try {
            for (int n = 0; n < millis; n += 5) {
                cancel.stopIfWished();
                Thread.sleep(5);
            }
        } catch (InterruptedException stop) {
            Thread.currentThread().interrupt();
            throw new Cancel.Cancelled();
        }
    }

    /**
     * Draws a picture, or takes it from those kept. Any thread but the desk's.
     *
     * @throws ShotException    if the take, frame or file is not there or not as it must be
     * @throws Cancel.Cancelled if cancelled
     */
    public Picture draw(OpenShot now, Ask ask, Cancel cancel) {
        return draw(now, ask, PictureWork.STEP_CELLS, cancel);
    }

    private Picture draw(OpenShot now, Ask ask, double step, Cancel cancel) {
        Key key = key(now, ask, step);
        synchronized (kept) {
            if (kept.containsKey(key)) {
                return kept.get(key);
            }
        }
        cancel.stopIfWished();
        Picture picture;
        if (ask.source() instanceof Source.Take take) {
            picture = take(now.setup(), Takes.of(now.folder()), take.number(), view(now, ask), ask.frame(), step, cancel);
        } else if (ask.source() instanceof Source.Wanted) {
            Picture original = draw(now, new Ask(Source.ORIGINAL, ask.view(), ask.frame(), ask.rows()), step, cancel);
            cancel.stopIfWished();
            picture = Retoucher.wanted(key.retouch(), original);
        } else {
            picture = rendered(now, ask);
        }
        keep(now, key, picture);
        return picture;
    }

    private static Picture take(Shot setup, Takes takes, int number, View view, int frame, double step,
                                Cancel cancel) {
        takes.requireOf(number, setup.flow());
        ScalarGrid density = takes.density(number, frame, setup.flow());
        int processors = Runtime.getRuntime().availableProcessors();
        try (Lanes lanes = new Lanes(step == DRAFT_STEP_CELLS ? processors : Math.max(1, processors - 1))) {
            return PictureWork.picture(setup, density, view, step, lanes, cancel);
        }
    }

    private static Picture rendered(OpenShot now, Ask ask) {
        ShotView view = now.setup().view(ask.view()).orElseThrow();
        String file = view.rendered().get(ask.frame());
        if (file == null) {
            throw new ShotException(Finding.of("shot.json", "/views", "no rendered frame " + ask.frame() + " in view '" + ask.view() + "'",
                    "a frame that was rendered", "show another frame, or add it to the view"));
        }
        return RenderedFrame.read(now.folder(), file, "/views/" + now.setup().views().indexOf(view) + "/rendered/" + ask.frame());
    }

    private static View view(OpenShot now, Ask ask) {
        View view = now.setup().view(ask.view()).orElseThrow().view();
        return ask.rows() == 0 || ask.rows() == view.raster().height() ? view : view.withRasterHeight(ask.rows());
    }

    private static long pixels(OpenShot now, Ask ask) {
        View view = view(now, ask);
        return (long) view.raster().width() * view.raster().height();
    }

    private static int draftRows(OpenShot now, Ask ask) {
        View view = view(now, ask);
        double aspect = (double) view.raster().width() / view.raster().height();
        return Math.max(1, Math.min(SMALL_ROWS, (int) Math.sqrt(DRAFT_PIXELS / aspect)));
    }

    private static Key key(OpenShot now, Ask ask, double step) {
        int rows = ask.rows() == 0 ? view(now, ask).raster().height() : ask.rows();
        Retouch retouch = ask.source() instanceof Source.Wanted wanted ? now.note(wanted.note()).orElseThrow().note().retouch() : null;
        return new Key(ask.source(), ask.view(), ask.frame(), rows, step, retouch);
    }

    private void keep(OpenShot now, Key key, Picture picture) {
        synchronized (kept) {
            if (shot == null || shot.folder() != now.folder() || kept.put(key, picture) != null) {
                return;
            }
            bytes += size(picture);
            while (bytes > mostBytes && kept.size() > 1) {
                Key oldest = kept.keySet().iterator().next();
                bytes -= size(kept.remove(oldest));
            }
        }
    }

    private static long size(Picture picture) {
        return 4L * Float.BYTES * picture.width() * picture.height();
    }
}
