package org.wispwright.ui.window;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.wispwright.ui.job.SampleWork;

/** Copies of the samples, for tests that change them. */
public final class SampleCopy {
    private SampleCopy() {
    }

    /** The kiln yard without takes, in a new folder below another. */
    public static Path kilnYard(Path below) {
        return SampleWork.copyBelow(below);
    }

    /** The same on half as many cells each way, which is simulated and solved in a few seconds. */
    public static Path quickYard(Path below) throws IOException {
        Path shot = kilnYard(below);
        Path setup = shot.resolve("shot.json");
        String text = Files.readString(setup);
        String quick = text.replace("\"cells\": [48, 64, 48], \"cellMetres\": 0.1", "\"cells\": [24, 32, 24], \"cellMetres\": 0.2");
        if (quick.equals(text)) {
            throw new IllegalStateException("the sample's grid is not what it was; correct this test");
        }
        Files.writeString(setup, quick);
        return shot;
    }
}
