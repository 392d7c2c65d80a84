package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;
import org.wispwright.render.view.View;
import org.wispwright.ui.job.PictureFile;
import org.wispwright.ui.job.PictureWork;
import org.wispwright.ui.job.RetouchWork;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.RetouchFile;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.Takes;
import org.wispwright.warp.retouch.Retouch;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** {@code retouch --picture PNG | --shot SHOT ..., --retouch FILE | --note ID, --out FILE}. */
@Command(name = "retouch", sortOptions = false,
        description = "Apply a retouch to one picture, a PNG or a frame of a take, and write the wanted picture. Says how much smoke "
                + "there is before and after: the sum of opacity over all pixels.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar retouch --picture smoke.png --retouch dent.json --out wanted.png",
            "  java -jar wispwright.jar retouch --shot samples/kiln-yard --note open-a-gap --out wanted.png",
            "  java -jar wispwright.jar retouch --shot samples/kiln-yard --take 0 --frame 1030 --view side --retouch dent.json --clear"
                + " --out wanted.png"})
final class RetouchCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private Means means;

    @Option(names = "--picture", paramLabel = "PNG", description = "The picture: smoke with its alpha, nothing behind it.")
    private Path in;

    @Option(names = "--shot", paramLabel = "SHOT", description = "Instead of a picture, the shot folder whose take is drawn.")
    private Path folder;

    @Option(names = "--take", paramLabel = "N", description = "With --shot: number of the take. Default: 0, the original.")
    private Integer take;

    @Option(names = "--frame", paramLabel = "F", description = "With --shot: the frame. Default: the note's.")
    private Integer frame;

    @Option(names = "--view", paramLabel = "V", description = "With --shot: the view. Default: the note's.")
    private String view;

    @Option(names = "--retouch", paramLabel = "FILE", description = "The retouch file.")
    private Path file;

    @Option(names = "--note", paramLabel = "ID", description = "With --shot, instead of a retouch file: the retouch of this note.")
    private String note;

    @Option(names = "--out", paramLabel = "FILE", required = true, description = "The PNG file to write.")
    private Path out;

    @Option(names = "--clear", description = "With --shot: leave the background clear instead of the shot's colour.")
    private boolean clear;

    @Option(names = "--bits", paramLabel = "8|16", defaultValue = "8", description = "Bits a channel in the file. Default: 8.")
    private int bits;

    @Spec
    private CommandSpec spec;

    @Override
    public Integer call() {
        requireUsage();
        RetouchWork.Result result;
        Picture shown;
        if (folder == null) {
            Retouch retouch = RetouchFile.read(file, Optional.empty()).retouch();
            result = RetouchWork.of(retouch, RetouchWork.read(in));
            shown = result.wanted();
        } else {
            Shot shot = ShotCheck.require(folder, means.memoryBytes());
            Optional<Note> named = note == null ? Optional.empty() : Optional.of(NoteEdits.of(ShotFolder.open(folder)).need(note).note());
            Retouch retouch = named.isPresent() ? named.get().retouch()
                    : RetouchFile.read(file, Optional.of(ShotFolder.open(folder))).retouch();
            result = RetouchWork.of(retouch, drawn(shot, frame == null ? named.orElseThrow().frame() : frame,
                    view == null ? named.orElseThrow().view() : view));
            shown = clear ? result.wanted() : PictureWork.over(result.wanted(), shot.background());
        }
        PictureFile.write(shown, out, bits == 8 ? PngFile.Depth.EIGHT : PngFile.Depth.SIXTEEN);
        say(result);
        return ExitCodes.OK;
    }

    private Picture drawn(Shot shot, int number, String name) {
        View camera = ShotChoice.view(shot, name).view();
        ShotChoice.requireFrame(shot, number);
        Takes takes = Takes.of(ShotFolder.open(folder));
        int of = take == null ? 0 : take;
        takes.requireOf(of, shot.flow());
        try (Lanes lanes = new Lanes(means.threads())) {
            return PictureWork.picture(shot, takes.density(of, number, shot.flow()), camera, lanes);
        }
    }

    private void say(RetouchWork.Result result) {
        Picture wanted = result.wanted();
        ObjectNode object = Manner.object().put("ok", true).put("file", out.toString()).put("width", wanted.width())
                .put("height", wanted.height()).put("massBefore", result.massBefore()).put("massAfter", result.massAfter());
        String change = result.massBefore() > 0
                ? String.format(Locale.ROOT, " (%+.1f %%)", 100 * (result.massAfter() / result.massBefore() - 1)) : "";
        manner.say(String.format(Locale.ROOT, "Wrote %s (%dx%d pixels). Mass %.4f before, %.4f after%s.", out,
                wanted.width(), wanted.height(), result.massBefore(), result.massAfter(), change), object);
    }

    private void requireUsage() {
        need((in == null) != (folder == null), "give one of --picture and --shot");
        need((file == null) != (note == null), "give one of --retouch and --note");
        need(note == null || folder != null, "--note needs --shot");
        need(folder != null || take == null && frame == null && view == null && !clear, "--take, --frame, --view and --clear need --shot");
        need(folder == null || note != null || frame != null && view != null, "--shot with --retouch needs --frame and --view");
        need(bits == 8 || bits == 16, "--bits " + bits + " is neither 8 nor 16");
        need(out.toString().toLowerCase(Locale.ROOT).endsWith(".png"), "--out '" + out + "' is not a PNG; give a name that ends in .png");
    }

    private void need(boolean met, String otherwise) {
        if (!met) {
            throw new ParameterException(spec.commandLine(), otherwise);
        }
    }
}
