package org.wispwright.ui.shot;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Locale;
import java.util.regex.Pattern;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.NpyFile;
import org.wispwright.render.volume.ScalarGrid;

/**
 * The number files of a take, NPY: {@code density.FFFF.npy} (nz, ny, nx), {@code velocity-x.FFFF.npy} (nz, ny, nx+1) and so on,
 * {@code force.npy} (count).
 */
final class TakeVolumes {
    private static final String FORCE = "force.npy";

    private TakeVolumes() {
    }

    static void write(Path take, int frame, SmokeState state) throws IOException {
        GridShape g = state.density().shape();
        MacVelocity u = state.velocity();
        NpyFile.write(take.resolve(file("density", frame)), state.density());
        if (state.temperature() != null) {
            NpyFile.write(take.resolve(file("temperature", frame)), state.temperature());
        }
        NpyFile.write(take.resolve(file("velocity-x", frame)), new int[] {g.nz(), g.ny(), g.nx() + 1}, u.x());
        NpyFile.write(take.resolve(file("velocity-y", frame)), new int[] {g.nz(), g.ny() + 1, g.nx()}, u.y());
        NpyFile.write(take.resolve(file("velocity-z", frame)), new int[] {g.nz() + 1, g.ny(), g.nx()}, u.z());
    }

    static void writeForce(Path take, double[] coefficients) throws IOException {
        ForceFile.write(take.resolve(FORCE), coefficients);
    }

    static ScalarGrid density(ShotFolder folder, String take, int frame, GridShape g) {
        return new ScalarGrid(g, values(folder, take + "/" + file("density", frame), g.nz(), g.ny(), g.nx()));
    }

    static SmokeState state(ShotFolder folder, String take, int frame, GridShape g) {
        float[] x = values(folder, take + "/" + file("velocity-x", frame), g.nz(), g.ny(), g.nx() + 1);
        float[] y = values(folder, take + "/" + file("velocity-y", frame), g.nz(), g.ny() + 1, g.nx());
        float[] z = values(folder, take + "/" + file("velocity-z", frame), g.nz() + 1, g.ny(), g.nx());
        return new SmokeState(density(folder, take, frame, g), new MacVelocity(g, x, y, z));
    }

    static double[] force(ShotFolder folder, String take) {
        String file = take + "/" + FORCE;
        try {
            return ForceFile.read(folder.file(file));
        } catch (IOException broken) {
            throw damaged(file, broken);
        }
    }

    private static float[] values(ShotFolder folder, String file, int... shape) {
        try {
            NpyFile.Contents contents = NpyFile.read(folder.file(file));
            if (!Arrays.equals(shape, contents.shape())) {
                throw new IOException("has shape " + Arrays.toString(contents.shape()) + ", the shot's grid needs "
                        + Arrays.toString(shape));
            }
            return contents.values();
        } catch (IOException broken) {
            throw damaged(file, broken);
        }
    }

    private static ShotException damaged(String file, Exception broken) {
        String reason = String.valueOf(broken.getMessage())
                .replaceAll("(?s)^volume file .*" + Pattern.quote(Path.of(file).getFileName().toString()) + ": ", "")
                .replaceAll("\\s+", " ").replaceAll("; [^;]*$", "").replaceAll("\\.$", "");
        return new ShotException(new Finding(file, "", "the file " + reason + "; move the take away and make it again."), broken);
    }

    static String file(String field, int frame) {
        return field + "." + String.format(Locale.ROOT, "%04d", frame) + ".npy";
    }
}
