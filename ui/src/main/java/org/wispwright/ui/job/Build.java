package org.wispwright.ui.job;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Properties;

/** Which build this is; the number comes from the build itself. */
public final class Build {
    private static final String VERSION = read();

    private Build() {
    }

    /** The version, such as "0.1.0". */
    public static String version() {
        return VERSION;
    }

    private static String read() {
        Properties properties = new Properties();
        try (InputStream in = Build.class.getResourceAsStream("build.properties")) {
            if (in == null) {
                throw new IllegalStateException("build.properties is missing from the program; build it again with mvn package");
            }
            properties.load(in);
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        }
        return properties.getProperty("version");
    }
}
