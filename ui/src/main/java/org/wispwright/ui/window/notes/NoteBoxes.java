package org.wispwright.ui.window.notes;

import java.io.File;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import javax.swing.JButton;
import javax.swing.JCheckBox;
import javax.swing.JComboBox;
import javax.swing.JFileChooser;
import javax.swing.JSpinner;
import javax.swing.JTextField;
import javax.swing.SpinnerNumberModel;
import javax.swing.filechooser.FileNameExtensionFilter;
import org.wispwright.ui.desk.Carrying;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.FrameList;
import org.wispwright.ui.desk.Message;
import org.wispwright.ui.desk.OpenShot;
import org.wispwright.ui.desk.PaintOvers;
import org.wispwright.ui.desk.Places;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.desk.TakeEntry;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.window.Words;

/** The questions that some actions on notes ask. */
final class NoteBoxes {
    private static final int MOST_STEP = 1000;

    private final Desk desk;
    private final Carrying carrying;
    private final PaintOvers paintOvers;
    private final Runnable leave;

    /** @param leave puts a box away */
    NoteBoxes(Desk desk, Runnable leave) {
        this.desk = desk;
        this.leave = leave;
        carrying = new Carrying(desk);
        paintOvers = new PaintOvers(desk);
    }

    /** To which frames a note is carried. */
    NoteBox carry(String id) {
        OpenShot shot = desk.state().shot().orElseThrow();
        Note note = shot.note(id).orElseThrow().note();
        NoteBox box = new NoteBox("carry", Words.of("notes.carry.title", note.words()), leave);
        JTextField frames = box.row("frames", Words.of("notes.carry.frames"), new JTextField());
        frames.setToolTipText(Words.of("notes.carry.frames.tip"));
        frames.putClientProperty("JTextField.placeholderText", Words.of("notes.carry.hint", note.frame() - 2, note.frame()));
        JSpinner every = box.row("every", Words.of("notes.every"), step());
        JCheckBox follow = box.bare("follow", Words.of("notes.carry.follow"), new JCheckBox(Words.of("notes.carry.follow")));
        follow.setOpaque(false);
        boolean there = desk.state().takes().stream().anyMatch(take -> take.number() == 0 && take.current());
        follow.setEnabled(there);
        follow.setToolTipText(Words.of(there ? "notes.carry.follow.tip" : "notes.carry.follow.none"));
        Runnable go = () -> {
            List<Integer> wished;
            try {
                wished = FrameList.parse(frames.getText(), (Integer) every.getValue(), shot.setup().flow().frames());
            } catch (ShotException refused) {
                desk.say(Message.Kind.FAULT, Desk.words(refused));
                return;
            }
            if (desk.state().shot().flatMap(s -> s.note(id)).isPresent()) {
                carrying.carry(Words.of("notes.edit.carry"), id, wished, follow.isSelected(), leave);
            }
        };
        frames.addActionListener(e -> go.run());
        box.ends(Words.of("notes.carry.done"), go);
        return box;
    }

    /** Between which two notes some are made. */
    NoteBox between(String id) {
        OpenShot shot = desk.state().shot().orElseThrow();
        Note note = shot.note(id).orElseThrow().note();
        NoteBox box = new NoteBox("between", Words.of("notes.between.title", note.words()), leave);
        JComboBox<Other> other = box.row("other", Words.of("notes.between.other"), new JComboBox<>());
        Places.inOrder(shot).stream().map(Listed::note).filter(n -> !n.id().equals(id)).map(Other::new).forEach(other::addItem);
        JSpinner every = box.row("every", Words.of("notes.every"), step());
        JCheckBox ease = box.bare("ease", Words.of("notes.between.ease"), new JCheckBox(Words.of("notes.between.ease")));
        ease.setOpaque(false);
        box.ends(Words.of("notes.between.done"), () -> {
            String second = ((Other) other.getSelectedItem()).note().id();
            Optional<OpenShot> now = desk.state().shot();
            if (now.flatMap(s -> s.note(id)).isPresent() && now.flatMap(s -> s.note(second)).isPresent()) {
                carrying.between(Words.of("notes.edit.between"), id, second, (Integer) every.getValue(), ease.isSelected(), leave);
            }
        });
        return box;
    }

    /** Which pictures a paint-over is read from. */
    NoteBox paintOver() {
        OpenShot shot = desk.state().shot().orElseThrow();
        Showing showing = desk.state().showing().orElseThrow();
        NoteBox box = new NoteBox("paint", Words.of("notes.paint.title", showing.frame(), showing.view()), leave);
        JTextField before = file(box, "before");
        String rendered = shot.setup().view(showing.view()).orElseThrow().rendered().get(showing.frame());
        before.setText(rendered == null ? "" : shot.folder().root().resolve(rendered).toString());
        JTextField after = file(box, "after");
        JTextField words = box.row("words", Words.of("notes.paint.words"), new JTextField(Words.of("notes.paint.usual")));
        box.ends(Words.of("notes.paint.done"), () -> {
            boolean judged = desk.state().takes().stream().filter(TakeEntry::current).anyMatch(take -> take.number() == 0);
            if (!judged) {
                desk.say(Message.Kind.FAULT, Words.of("notes.paint.none"));
                return;
            }
            paths(before, after).ifPresent(both -> {
                desk.say(Message.Kind.NOTICE, Words.of("notes.paint.reading"));
                paintOvers.read(both.get(0), both.get(1), words.getText().strip(), Words.of("notes.paint.nothing"), leave);
            });
        });
        return box;
    }

    private Optional<List<Path>> paths(JTextField before, JTextField after) {
        try {
            if (!before.getText().isBlank() && !after.getText().isBlank()) {
                return Optional.of(List.of(Path.of(before.getText().strip()), Path.of(after.getText().strip())));
            }
        } catch (InvalidPathException none) {
            desk.say(Message.Kind.FAULT, Words.of("notes.paint.path", none.getInput()));
            return Optional.empty();
        }
        desk.say(Message.Kind.FAULT, Words.of("notes.paint.two"));
        return Optional.empty();
    }

    private static JTextField file(NoteBox box, String part) {
        JTextField field = box.row(part, Words.of("notes.paint." + part), new JTextField());
        field.setToolTipText(Words.of("notes.paint." + part + ".tip"));
        JButton choose = box.bare(part + "-choose", Words.of("notes.paint." + part + ".choose"),
                new JButton(Words.of("notes.paint.choose")));
        choose.addActionListener(e -> chosen(box, field).ifPresent(file -> field.setText(file.getPath())));
        return field;
    }

    private static Optional<File> chosen(NoteBox box, JTextField now) {
        JFileChooser chooser = new JFileChooser(now.getText().isBlank() ? null : new File(now.getText()).getParentFile());
        chooser.setFileFilter(new FileNameExtensionFilter(Words.of("notes.paint.files"), "png", "exr"));
        return chooser.showOpenDialog(box) == JFileChooser.APPROVE_OPTION ? Optional.of(chooser.getSelectedFile()) : Optional.empty();
    }

    private static JSpinner step() {
        JSpinner every = new JSpinner(new SpinnerNumberModel(1, 1, MOST_STEP, 1));
        every.setToolTipText(Words.of("notes.every.tip"));
        return every;
    }

    /** A note in a list. */
    private record Other(Note note) {
        @Override
        public String toString() {
            return note.frame() + "  " + note.words();
        }
    }
}
