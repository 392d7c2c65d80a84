package org.wispwright.ui.shot;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.wispwright.render.files.WholeFile;

/** The note files of a shot as texts, to the byte: what is read and written again is the same file. */
final class NoteFiles {
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

    /** Something has this name, be it a file or not. */
    boolean isTaken(String file) {
        return Files.exists(folder.inside(file), LinkOption.NOFOLLOW_LINKS);
    }

    /** The text of a note that must be there. @throws ShotException if it is not, or is no text that can be put back */
    String need(String id) {
        String file = file(id);
        return text(file).orElseThrow(() -> {
            List<String> ids = ids();
            return new ShotException(Finding.of(file, "", "no such note", ids.isEmpty() ? "a note of the shot" : "one of "
                    + String.join(", ", ids), NearestWord.to(id, ids).map(near -> "did you mean '" + near + "'").orElse("correct the id")));
        });
    }

    /** The whole text of a file; empty if there is none. @throws ShotException if it cannot be read as text */
    Optional<String> text(String file) {
        if (!isTaken(file)) {
            return Optional.empty();
        }
        if (Files.isSymbolicLink(folder.inside(file))) {
            throw new ShotException(Finding.of(file, "", "a link", "a file that can be changed and put back",
                    "copy the file into the folder in its place"));
        }
        return Optional.of(decoded(file, folder.bytes(file, NoteReader.MOST_BYTES)));
    }

    /** Puts a text in a file, whole or not at all, or removes the file. @throws ShotException if the disk refuses */
    void put(String file, Optional<String> text) {
        Path path = folder.inside(file);
        try {
            if (text.isEmpty()) {
                Files.delete(path);
                return;
            }
            byte[] bytes = text.get().getBytes(StandardCharsets.UTF_8);
            WholeFile.write(path, out -> out.write(bytes));
        } catch (IOException refused) {
            throw cannotWrite(file, refused);
        }
    }

    /** UTF-8, strictly, a byte order mark kept, so that the same bytes come out again. */
    static String decoded(String file, byte[] bytes) {
        try {
            return StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString();
        } catch (CharacterCodingException notUtf8) {
            throw new ShotException(Finding.of(file, "", "bytes that are not UTF-8", "text in UTF-8", "save it as UTF-8 in a text editor"),
                    notUtf8);
        }
    }

    static ShotException cannotWrite(String file, IOException refused) {
        return new ShotException(Finding.of(file, "", "a place that cannot be written to (" + refused.getClass().getSimpleName() + ")",
                "a writable folder with room on the disk", "check permissions and free space"), refused);
    }
}
