package org.wispwright.ui.window.easel;

import java.awt.geom.Path2D;
import java.util.Objects;
import java.util.Optional;
import java.util.function.Consumer;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.ui.desk.Against;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.OpenShot;
import org.wispwright.ui.desk.Pictures.Ask;
import org.wispwright.ui.desk.Replacing;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.measure.Plane;
import org.wispwright.warp.outline.Loop;
import org.wispwright.warp.outline.OutlineTracer;

/**
 * What lies on the easel, made ready beside Swing's thread: the plates of both pictures, their mix, and the wanted outline. While something
 * new is on its way the old stays.
 */
final class EaselPictures {
    /** Opacity at which the wanted outline is drawn. */
    static final double OUTLINE_LEVEL = 0.3;

    private final Desk desk;
    private final Runnable changed;
    private final Consumer<String> missing;
    private final Replacing coding;
    private final Replacing mixing;
    private final Replacing outlining;
    private DeskState now;
    private Picture near;
    private Picture far;
    private Plate nearPlate;
    private Plate farPlate;
    private Plate mixed;
    private Tone tone;
    private Tone oldTone;
    private int nearFrame;
    private int plateFrame;
    private Path2D outline;
    private Picture outlined;

    /** @param changed something is to be drawn anew @param missing why there is no picture; empty if there is one */
    EaselPictures(Desk desk, Runnable changed, Consumer<String> missing) {
        this.desk = desk;
        this.changed = changed;
        this.missing = missing;
        coding = new Replacing(desk.workers(), desk.workers().lane("coding"));
        mixing = new Replacing(desk.workers(), desk.workers().lane("mixing"));
        outlining = new Replacing(desk.workers(), desk.workers().lane("outline"));
        now = desk.state();
    }

    /** The first picture, or the mix of both; null before there is one. */
    Plate near() {
        return isMixed() && mixed != null ? mixed : nearPlate;
    }

    /** The second picture; null if there is none. */
    Plate far() {
        return farPlate;
    }

    /** The first picture itself; null before there is one. */
    Picture nearPicture() {
        return near;
    }

    /** True if what lies on the easel, be it a draft, is of the frame that is wished for. */
    boolean isOfFrameShown() {
        return nearPlate != null && now.showing().map(s -> s.frame() == plateFrame).orElse(false);
    }

    /** The tone of the moment; null before there is a shot. */
    Tone tone() {
        return tone;
    }

    /** The wanted outline in heights; null for none. */
    Path2D outline() {
        return outline;
    }

    private boolean isMixed() {
        return now.showing().map(s -> s.against() == Against.FADE || s.against() == Against.DIFFERENCE).orElse(false);
    }

    /** Follows the desk. */
    void follow(DeskState state) {
        DeskState before = now;
        now = state;
        if (state.shot().isEmpty()) {
            return;
        }
        OpenShot shot = state.shot().get();
        Showing showing = state.showing().orElseThrow();
        boolean otherShot = before.shot().map(s -> s.folder() != shot.folder()).orElse(true);
        boolean otherNotes = otherShot || before.shot().get().notes() != shot.notes();
        boolean otherTakes = before.takes() != state.takes();
        Optional<Showing> was = otherShot ? Optional.empty() : before.showing();
        if (otherShot) {
            near = null;
            far = null;
            nearPlate = null;
            farPlate = null;
        }
        if (was.map(s -> s.exposure() != showing.exposure() || s.gamma() != showing.gamma()).orElse(true)) {
            tone = new Tone(shot.setup().background(), showing.exposure(), showing.gamma());
            code();
        }
        boolean moved = was.map(s -> s.frame() != showing.frame() || !s.view().equals(showing.view())).orElse(true);
        if (moved || otherTakes || !was.get().near().equals(showing.near()) || otherNotes && showing.near() instanceof Source.Wanted) {
            ask("easel near", state.seen(showing.near()), picture -> near = picture, true);
        }
        if (showing.other().isEmpty()) {
            far = null;
            farPlate = null;
        } else if (moved || otherTakes || !was.get().other().equals(showing.other()) || otherNotes && showing.far() instanceof Source.Wanted) {
            ask("easel far", state.seen(showing.far()), picture -> far = picture, false);
        }
        if (isMixed() && was.map(s -> s.fade() != showing.fade() || s.gain() != showing.gain() || s.against() != showing.against())
                .orElse(true)) {
            mix();
        }
        if (moved || otherNotes || otherTakes || !before.note().equals(state.note()) || was.get().outline() != showing.outline()) {
            traceOutline();
        }
        changed.run();
    }

    private void ask(String name, Source source, Consumer<Picture> put, boolean first) {
        Showing showing = now.showing().orElseThrow();
        desk.pictures().ask(name, now.shot().orElseThrow(), new Ask(source, showing.view(), showing.frame(), 0), drawn -> {
            put.accept(drawn.picture());
            if (first) {
                nearFrame = showing.frame();
                missing.accept("");
            }
            code();
            mix();
        }, why -> {
            put.accept(null);
            if (first) {
                missing.accept(now.takes().isEmpty() && source.equals(Source.ORIGINAL) ? Words.of("easel.making") : why);
            }
            code();
        });
    }

    /** Codes both pictures on a worker. */
    private void code() {
        Picture a = near;
        Picture b = far;
        Tone how = tone;
        Plate oldA = nearPlate;
        Plate oldB = farPlate;
        boolean sameTone = oldTone == how;
        int frame = nearFrame;
        coding.replace(cancel -> new Plate[] {plate(a, how, sameTone ? oldA : null), plate(b, how, sameTone ? oldB : null)}, plates -> {
            nearPlate = plates[0];
            plateFrame = frame;
            farPlate = plates[1];
            oldTone = how;
            changed.run();
        }, thrown -> missing.accept(Desk.words(thrown)));
    }

    private static Plate plate(Picture picture, Tone tone, Plate old) {
        return picture == null ? null : old != null && old.picture() == picture ? old : new Plate(picture, tone);
    }

    private void mix() {
        Showing showing = now.showing().orElseThrow();
        Picture a = near;
        Picture b = far;
        Tone how = tone;
        if (!isMixed() || a == null || b == null) {
            mixed = null;
            return;
        }
        Rgb background = now.shot().orElseThrow().setup().background();
        mixing.replace(cancel -> new Plate(showing.against() == Against.FADE ? Mixing.fade(a, b, showing.fade())
                : Mixing.difference(a, b, background, showing.gain()), how), plate -> {
            mixed = plate;
            changed.run();
        }, thrown -> missing.accept(Desk.words(thrown)));
    }

    /** The outline of the open note's wish, if the easel shows its frame. */
    private void traceOutline() {
        if (!now.isAtOpenNote() || !now.showing().orElseThrow().outline()) {
            outline = null;
            outlined = null;
            outlining.drop();
            return;
        }
        OpenShot shot = now.shot().orElseThrow();
        Showing showing = now.showing().get();
        Ask ask = new Ask(new Source.Wanted(now.note().orElseThrow()), showing.view(), showing.frame(), 0);
        Picture known = outlined;
        Path2D old = outline;
        outlining.replace(cancel -> {
            Picture wanted = desk.pictures().draw(shot, ask, cancel);
            return new Traced(wanted, wanted == known ? old : trace(wanted));
        }, traced -> {
            outlined = traced.picture();
            outline = traced.path();
            changed.run();
        }, thrown -> outline = null);
    }

    private record Traced(Picture picture, Path2D path) {
        Traced {
            Objects.requireNonNull(picture);
        }
    }

    /** Outlines of a picture's opacity, in heights. */
    static Path2D trace(Picture picture) {
        Path2D path = new Path2D.Double();
        for (Loop loop : OutlineTracer.trace(Plane.alpha(picture), OUTLINE_LEVEL)) {
            path.moveTo(loop.x()[0], loop.y()[0]);
            for (int n = 1; n < loop.size(); n++) {
                path.lineTo(loop.x()[n], loop.y()[n]);
            }
            path.closePath();
        }
        return path;
    }
}
