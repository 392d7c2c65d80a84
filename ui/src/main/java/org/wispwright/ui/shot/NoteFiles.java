package org.wispwright.ui.shot;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.wispwright.render.files.WholeFile;

/**
 * The files of a shot's notes, to the byte: what is read and written again is the same file. A note is {@code notes/ID.json} and
 * whatever lies beside it under a name that begins with {@code ID.}, such as {@code notes/ID.sky.png}: ids have no dot, so every
 * file belongs to one note, and goes where its note goes.
 */
final class NoteFiles {
    /** The most a file beside a note may weigh: 64 MiB. */
    static final long MOST_BYTES_BESIDE = 64L << 20;
    /** What a file of a note is called. */
    static final String FILE = "notes/" + NoteReader.ID + "(\\.[A-Za-z0-9_-]{1,64}){1,3}";
    private static final int MOST_FILES = 100_000;

    private final ShotFolder folder;

    NoteFiles(ShotFolder folder) {
        this.folder = folder;
    }

    /** The file of a note. @throws ShotException if that is no id a note may have */
    static String file(String id) {
        if (!id.matches(NoteReader.ID)) {
            throw new ShotException(Finding.of("notes", "", "the id '" + id.replaceAll("\\p{Cntrl}", " ") + "'",
                    "letters, digits, '-' and '_', at most 64, the first a letter or digit", "correct the id"));
        }
        return "notes/" + id + ".json";
    }

    /** Ids of all note files, sorted. */
    List<String> ids() {
        return folder.names("notes", ".json", NoteReader.MOST_NOTES).stream()
                .map(name -> name.substring(0, name.length() - ".json".length())).toList();
    }

    /**
     * Files that lie beside a note's own, sorted; folders, such as a paint-over's, stay where they are.
     *
     * @throws ShotException if one has a name that no file of a note may have
     */
    List<String> beside(String id) {
        List<String> files = folder.names("notes", "", MOST_FILES).stream().filter(name -> name.startsWith(id + "."))
                .map(name -> "notes/" + name).filter(file -> !file.equals(file(id)))
                .filter(file -> !Files.isDirectory(folder.inside(file), LinkOption.NOFOLLOW_LINKS)).toList();
        for (String file : files) {
            if (!file.matches(FILE)) {
                throw new ShotException(Finding.of(file.replaceAll("\\p{Cntrl}", " "), "", "a name that no file of note '" + id
                        + "' may have", "letters, digits, '-' and '_' between at most three dots", "rename it or move it away"));
            }
        }
        return files;
    }

    /** Something has this name, be it a file or not. */
    boolean isTaken(String file) {
        return Files.exists(folder.inside(file), LinkOption.NOFOLLOW_LINKS);
    }

    /** The text of a note that must be there. @throws ShotException if it is not, or is no text */
    String need(String id) {
        String file = file(id);
        FileBytes bytes = bytes(file).orElseThrow(() -> {
            List<String> ids = ids();
            return new ShotException(Finding.of(file, "", "no such note", ids.isEmpty() ? "a note of the shot" : "one of "
                    + String.join(", ", ids), NearestWord.to(id, ids).map(near -> "did you mean '" + near + "'").orElse("correct the id")));
        });
        return bytes.text().orElseThrow(() -> new ShotException(Finding.of(file, "", "bytes that are not UTF-8", "text in UTF-8",
                "save it as UTF-8 in a text editor")));
    }

    /** A file's content; empty if there is none. @throws ShotException if it is a link, too large or cannot be read */
    Optional<FileBytes> bytes(String file) {
        if (!isTaken(file)) {
            return Optional.empty();
        }
        if (Files.isSymbolicLink(folder.inside(file))) {
            throw new ShotException(Finding.of(file, "", "a link", "a file that can be changed and put back",
                    "copy the file into the folder in its place"));
        }
        return Optional.of(new FileBytes(folder.bytes(file, mostBytes(file))));
    }

    /** The most that a file of a note may weigh. */
    static long mostBytes(String file) {
        return file.endsWith(".json") ? NoteReader.MOST_BYTES : MOST_BYTES_BESIDE;
    }

    /** Puts a content in a file, whole or not at all, or removes the file if it is there. @throws ShotException if the disk refuses */
    void put(String file, Optional<FileBytes> content) {
        Path path = folder.inside(file);
        try {
            if (content.isEmpty()) {
                Files.deleteIfExists(path);
                return;
            }
            WholeFile.write(path, out -> out.write(content.get().bytes()));
        } catch (IOException refused) {
            throw cannotWrite(file, refused);
        }
    }

    static ShotException cannotWrite(String file, IOException refused) {
        return new ShotException(Finding.of(file, "", "a place that cannot be written to (" + refused.getClass().getSimpleName() + ")",
                "a writable folder with room on the disk", "check permissions and free space"), refused);
    }
}
