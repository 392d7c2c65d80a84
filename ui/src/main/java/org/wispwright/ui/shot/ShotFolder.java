package org.wispwright.ui.shot;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/**
 * A shot folder on disk, and the only way to a file inside it: a path that would lead out of the folder is refused,
 * whether it says so ({@code ..}, an absolute path) or a symbolic link does it quietly.
 */
public final class ShotFolder {
    private static final Pattern DRIVE = Pattern.compile("^[A-Za-z]:.*");

    private static final String LEAVES = "a path that leaves the shot folder";
    private static final String COPY_IN = "copy the file into the folder and name it relative to the folder";

    private final Path root;
    private final Path real;

    private ShotFolder(Path root, Path real) {
        this.root = root;
        this.real = real;
    }

    /**
     * Opens a folder that has a {@code shot.json}. Writes nothing.
     *
     * @throws ShotException if there is no such folder, or no shot.json in it
     */
    public static ShotFolder open(Path folder) {
        if (!Files.isDirectory(folder)) {
            boolean file = Files.exists(folder);
            throw new ShotException(Finding.of(folder.toString(), "", file ? "a file" : "nothing", "a shot folder",
                    file && "shot.json".equals(String.valueOf(folder.getFileName())) ? "give the folder that holds it" : "check the path"));
        }
        Path real;
        try {
            real = folder.toRealPath();
        } catch (IOException unreadable) {
            throw new ShotException(Finding.of(folder.toString(), "", "a folder that cannot be entered", "a readable shot folder",
                    "check its permissions"), unreadable);
        }
        ShotFolder shot = new ShotFolder(folder, real);
        if (!Files.exists(folder.resolve("shot.json"))) {
            throw new ShotException(Finding.of(folder.resolve("shot.json").toString(), "", "no such file", "shot.json in the shot folder",
                    "check the path, or make the shot first (docs/shot-folder.md)"));
        }
        return shot;
    }

    /** The folder as the person gave it. */
    public Path root() {
        return root;
    }

    /**
     * An existing file inside the folder.
     *
     * @param relative with forward slashes, such as {@code frames/front.1030.png}
     * @throws ShotException if the path leads out of the folder, or there is no such readable file
     */
    public Path file(String relative) {
        Path path = inside(relative);
        if (!Files.exists(path)) {
            throw new ShotException(Finding.of(relative, "", "no such file", "this file in the shot folder",
                    "put it there or correct the name"));
        }
        Path where;
        try {
            where = path.toRealPath();
        } catch (IOException unreadable) {
            throw new ShotException(Finding.of(relative, "", "a file that cannot be reached", "a readable file", "check its permissions"),
                    unreadable);
        }
        if (!where.startsWith(real)) {
            throw new ShotException(Finding.of(relative, "", "a link that leads out of the shot folder", "a file inside it",
                    "copy the file into the folder"));
        }
        if (!Files.isRegularFile(where) || !Files.isReadable(where)) {
            throw new ShotException(Finding.of(relative, "", Files.isDirectory(where) ? "a folder"
                    : "something that is not a readable file", "a readable file",
                    "check its name and permissions"));
        }
        return path;
    }

    /**
     * A path inside the folder, whether or not something is there.
     *
     * @throws ShotException if it is absolute or leads out of the folder
     */
    public Path inside(String relative) {
        if (leaves(relative)) {
            throw new ShotException(Finding.of(relative.isBlank() ? "(empty path)" : relative, "", LEAVES, "a path inside it", COPY_IN));
        }
        return root.resolve(relative);
    }

    /** The path that a JSON value names, checked as in {@link #inside}, with a complaint that says which value it is. */
    static String named(JsonPlace place) {
        String relative = place.text(1000);
        if (leaves(relative)) {
            throw place.fault("'" + relative + "', " + LEAVES, "a path inside it", COPY_IN);
        }
        return relative;
    }

    private static boolean leaves(String relative) {
        if (relative.isBlank() || relative.indexOf('\0') >= 0 || relative.startsWith("/") || relative.startsWith("\\")
                || DRIVE.matcher(relative).matches()) {
            return true;
        }
        for (String part : relative.split("[/\\\\]", -1)) {
            if (part.equals("..")) {
                return true;
            }
        }
        try {
            return Path.of(relative).isAbsolute();
        } catch (InvalidPathException notAPath) {
            return true;
        }
    }

    /**
     * A file's bytes.
     *
     * @param mostBytes refused when larger, before anything is read
     * @throws ShotException if the file is missing, outside, too large or unreadable
     */
    public byte[] bytes(String relative, long mostBytes) {
        Path path = file(relative);
        try (InputStream in = Files.newInputStream(path)) {
            long size = Files.size(path);
            if (size > mostBytes) {
                throw new ShotException(Finding.of(relative, "", size + " bytes", "at most " + mostBytes + " bytes",
                        "check that it is the right file"));
            }
            // A file may grow between the question and the reading: never take more than was allowed.
            return in.readNBytes((int) Math.min(mostBytes, Integer.MAX_VALUE - 16));
        } catch (IOException unreadable) {
            throw new ShotException(Finding.of(relative, "", "a file that cannot be read", "a readable file", "check its permissions"),
                    unreadable);
        }
    }

    /**
     * Names in a sub-folder that match a glob, sorted; empty if there is no such folder.
     *
     * @throws ShotException if the folder cannot be listed or has more than {@code most} of them
     */
    public List<String> names(String subFolder, String ending, int most) {
        Path folder = inside(subFolder);
        if (!Files.isDirectory(folder)) {
            return List.of();
        }
        try (Stream<Path> entries = Files.list(folder)) {
            List<String> names = entries.map(p -> p.getFileName().toString()).filter(n -> n.endsWith(ending)).sorted().limit(most + 1L)
                    .toList();
            if (names.size() > most) {
                throw new ShotException(Finding.of(subFolder, "", "more than " + most + " files", "at most " + most, "split the shot"));
            }
            return names;
        } catch (IOException unreadable) {
            throw new ShotException(Finding.of(subFolder, "", "a folder that cannot be listed", "a readable folder",
                    "check its permissions"), unreadable);
        }
    }
}
