package org.wispwright.ui.shot;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.stream.Stream;

/** A digest of all that a person put into a shot folder: takes, and files whose names begin with a dot, left out. */
public final class ShotDigest {
    private ShotDigest() {
    }

    /**
     * SHA-256 over names and bytes, in the order of the names.
     *
     * @param also what else must be the same, such as settings
     * @return 64 hexadecimal digits
     * @throws ShotException if a file cannot be read
     */
    public static String of(ShotFolder shot, String also) {
        Path root = shot.root();
        try (Stream<Path> paths = Files.walk(root)) {
            MessageDigest digest = MessageDigest.getInstance("SHA-256");
            digest.update(also.getBytes(StandardCharsets.UTF_8));
            List<Path> files = paths.filter(p -> counts(root.relativize(p))).filter(p -> Files.isRegularFile(p, LinkOption.NOFOLLOW_LINKS))
                    .sorted().toList();
            for (Path file : files) {
                digest.update((byte) 0);
                digest.update(root.relativize(file).toString().replace('\\', '/').getBytes(StandardCharsets.UTF_8));
                digest.update((byte) 0);
                try (InputStream in = Files.newInputStream(file)) {
                    byte[] buffer = new byte[1 << 16];
                    for (int n = in.read(buffer); n >= 0; n = in.read(buffer)) {
                        digest.update(buffer, 0, n);
                    }
                }
            }
            return HexFormat.of().formatHex(digest.digest());
        } catch (IOException unreadable) {
            throw new ShotException(Finding.of(root.toString(), "", "a folder that cannot be read whole", "a readable shot folder",
                    "check the permissions of what is in it"), unreadable);
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException(impossible);
        }
    }

    private static boolean counts(Path relative) {
        for (Path part : relative) {
            if (part.toString().startsWith(".") && !part.toString().isEmpty()) {
                return false;
            }
        }
        return !relative.startsWith("takes");
    }
}
