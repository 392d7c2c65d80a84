package org.wispwright.ui.window.takes;

import java.nio.file.Path;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.Supplier;
import javax.swing.JButton;
import javax.swing.JFileChooser;
import javax.swing.JPanel;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.WritingOut;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** What can be written out of the take that is shown. */
final class WriteBox extends JPanel {
    private final Desk desk;
    private final JButton pictures = SolveBox.button("take.write-pictures");
    private final JButton frame = SolveBox.button("take.write-frame");
    private final JButton sheet = SolveBox.button("take.write-sheet");
    private final JButton files = SolveBox.button("take.write-files");
    private final JButton stop = SolveBox.button("take.write-stop");
    private final Sentence line = new Sentence("write-line").in(Palette.QUIET.colour());
    private Supplier<Optional<Path>> chooser = this::choose;

    WriteBox(Desk desk) {
        super(new MigLayout("insets 0, fillx, wrap 1, hidemode 3", "[grow,fill]"));
        this.desk = desk;
        setOpaque(false);
        JPanel box = Column.box("write-box", Words.of("takes.write"));
        for (JButton button : new JButton[] {pictures, frame, sheet, files}) {
            box.add(button, "wmin 0");
        }
        box.add(line, "wmin 0");
        box.add(stop, "wmin 0");
        pictures.addActionListener(e -> writePictures(true));
        frame.addActionListener(e -> writePictures(false));
        sheet.addActionListener(e -> writeSheet());
        files.addActionListener(e -> writeFiles());
        stop.addActionListener(e -> desk.writingOut().stop());
        add(box, "wmin 0");
    }

    /** Has folders chosen in another way than by a dialog. */
    void chooseBy(Supplier<Optional<Path>> other) {
        chooser = other;
    }

    void writePictures(boolean whole) {
        into(folder -> desk.writingOut().pictures(folder, whole));
    }

    void writeSheet() {
        into(desk.writingOut()::sheet);
    }

    void writeFiles() {
        into(desk.writingOut()::files);
    }

    private void into(Consumer<Path> write) {
        chooser.get().ifPresent(write);
    }

    private Optional<Path> choose() {
        JFileChooser dialog = new JFileChooser();
        dialog.setName("choose-place");
        dialog.setDialogTitle(Words.of("takes.write.where"));
        dialog.setFileSelectionMode(JFileChooser.DIRECTORIES_ONLY);
        return dialog.showDialog(this, Words.of("takes.write.here")) == JFileChooser.APPROVE_OPTION
                ? Optional.of(dialog.getSelectedFile().toPath()) : Optional.empty();
    }

    void follow(DeskState state) {
        setVisible(!state.takes().isEmpty());
        boolean can = WritingOut.can(state);
        pictures.setEnabled(can);
        frame.setEnabled(can);
        files.setEnabled(can);
        sheet.setEnabled(WritingOut.canSheet(state));
        line.say(state.work().writing().map(w -> w.line()).orElse(""));
        stop.setVisible(state.work().writing().isPresent());
    }
}
