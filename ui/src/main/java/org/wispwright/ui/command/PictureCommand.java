package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.util.Locale;
import java.util.concurrent.Callable;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.ScalarGrid;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.Takes;
import org.wispwright.ui.job.PictureFile;
import org.wispwright.ui.job.PictureWork;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** {@code picture SHOT --take N --frame F --view V --out FILE}. */
@Command(name = "picture", sortOptions = false, description = "Draw one frame of a take through one of the shot's views, as a PNG.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar picture samples/kiln-yard --take 0 --frame 1030 --view front --out front.png",
            "  java -jar wispwright.jar picture samples/kiln-yard --take 1 --frame 1030 --view side --clear --out side.png"})
final class PictureCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private ShotChoice choice;

    @Option(names = "--take", paramLabel = "N", required = true, description = "Number of the take; 0 is the original.")
    private int take;

    @Option(names = "--frame", paramLabel = "F", required = true, description = "Frame number.")
    private int frame;

    @Option(names = "--view", paramLabel = "V", required = true, description = "Name of the view.")
    private String view;

    @Option(names = "--out", paramLabel = "FILE", required = true, description = "The PNG file to write.")
    private Path out;

    @Option(names = "--height", paramLabel = "ROWS", description = "Rows of the picture. Default: the view's raster.")
    private Integer rows;

    @Option(names = "--clear", description = "Leave the background clear (premultiplied smoke alone) instead of the shot's colour.")
    private boolean clear;

    @Spec
    private CommandSpec spec;

    @Override
    public Integer call() {
        if (!out.toString().toLowerCase(Locale.ROOT).endsWith(".png")) {
            throw new ParameterException(spec.commandLine(), "--out '" + out + "' is not a PNG; give a name that ends in .png");
        }
        if (rows != null && (rows < 1 || rows > Picture.LONGEST_SIDE / 8)) {
            throw new ParameterException(spec.commandLine(), "--height " + rows + " is not a number of rows from 1 to "
                    + Picture.LONGEST_SIDE / 8);
        }
        Shot shot = choice.shot();
        View camera = ShotChoice.view(shot, view).view();
        View drawn = rows == null ? camera : camera.withRasterHeight(rows);
        ShotChoice.requireFrame(shot, frame);
        Takes takes = choice.takes();
        takes.requireOf(take, shot.flow());
        ScalarGrid density = takes.density(take, frame, shot.flow());
        Picture picture;
        try (Lanes lanes = new Lanes(choice.threads())) {
            picture = PictureWork.picture(shot, density, drawn, lanes);
        }
        PictureFile.write(clear ? picture : PictureWork.over(picture, shot.background()), out);
        ObjectNode object = Manner.object().put("ok", true).put("file", out.toString()).put("width", picture.width())
                .put("height", picture.height());
        manner.say("Wrote " + out + " (" + picture.width() + "x" + picture.height() + " pixels).", object);
        return ExitCodes.OK;
    }
}
