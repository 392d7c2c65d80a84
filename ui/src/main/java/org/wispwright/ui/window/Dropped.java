package org.wispwright.ui.window;

import java.awt.datatransfer.DataFlavor;
import java.awt.datatransfer.UnsupportedFlavorException;
import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import javax.swing.TransferHandler;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Message;

/** Files dropped on the window: a shot folder, or its shot.json, is opened; with any other folder or picture the guided set-up
 * begins. */
final class Dropped extends TransferHandler {
    private final transient Desk desk;
    private final transient Consumer<Optional<Path>> begin;

    /** @param begin opens the guided set-up with a folder of frames */
    Dropped(Desk desk, Consumer<Optional<Path>> begin) {
        this.desk = desk;
        this.begin = begin;
    }

    @Override
    public boolean canImport(TransferSupport support) {
        return support.isDataFlavorSupported(DataFlavor.javaFileListFlavor);
    }

    @Override
    public boolean importData(TransferSupport support) {
        try {
            List<?> files = (List<?>) support.getTransferable().getTransferData(DataFlavor.javaFileListFlavor);
            return !files.isEmpty() && take(((File) files.get(0)).toPath());
        } catch (UnsupportedFlavorException | IOException unreadable) {
            desk.say(Message.Kind.FAULT, Words.of("drop.unreadable"));
            return false;
        }
    }

    /** Takes what was dropped. @return false if there is no use for it, which is said */
    boolean take(Path file) {
        Path shot = file.endsWith("shot.json") ? file.toAbsolutePath().getParent() : file;
        if (Files.isRegularFile(shot.resolve("shot.json"))) {
            desk.open(shot);
            return true;
        }
        Path folder = Files.isDirectory(file) ? file : file.toAbsolutePath().getParent();
        if (!Files.isDirectory(folder)) {
            desk.say(Message.Kind.FAULT, Words.of("drop.unreadable"));
            return false;
        }
        begin.accept(Optional.of(folder));
        return true;
    }
}
