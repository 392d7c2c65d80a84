package org.wispwright.ui.window.notes;

import java.awt.event.ActionEvent;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.KeyAdapter;
import java.awt.event.KeyEvent;
import java.util.function.Consumer;
import javax.swing.AbstractAction;
import javax.swing.BorderFactory;
import javax.swing.JTextArea;
import javax.swing.KeyStroke;
import javax.swing.border.Border;
import org.wispwright.ui.window.Palette;

/** A note's words: to read, and on demand to edit in place. Enter and leaving it keep what was typed, Escape drops it. */
final class NoteWords extends JTextArea {
    private static final Border READ = BorderFactory.createEmptyBorder(2, 2, 2, 2);

    private final Consumer<String> keep;
    private final Runnable ended;
    private String words = "";
    private boolean pressed;

    /**
     * @param keep  told of other words
     * @param ended told when editing has ended, kept or not
     */
    NoteWords(Consumer<String> keep, Runnable ended) {
        this.keep = keep;
        this.ended = ended;
        setLineWrap(true);
        setWrapStyleWord(true);
        reading();
        addKeyListener(new KeyAdapter() {
            @Override
            public void keyPressed(KeyEvent e) {
                pressed = true;
            }

            @Override
            public void keyTyped(KeyEvent e) {
                if (!pressed) {
                    e.consume();                                               // the letter of the shortcut that began it
                }
            }
        });
        on("ENTER", () -> end(true));
        on("ESCAPE", () -> end(false));
        addFocusListener(new FocusAdapter() {
            @Override
            public void focusLost(FocusEvent e) {
                if (!e.isTemporary()) {
                    end(true);
                }
            }
        });
    }

    private void on(String key, Runnable run) {
        getInputMap(WHEN_FOCUSED).put(KeyStroke.getKeyStroke(key), key);
        getActionMap().put(key, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent e) {
                run.run();
            }
        });
    }

    /** Other words, unless they are being edited. */
    void show(String text) {
        words = text;
        if (!isEditable() && !getText().equals(text)) {
            setText(text);
        }
    }

    /** Lets a person type. */
    void edit() {
        if (isEditable()) {
            return;
        }
        pressed = false;
        setEditable(true);
        setFocusable(true);
        setOpaque(true);
        setBorder(BorderFactory.createCompoundBorder(BorderFactory.createLineBorder(Palette.ACCENT.colour()),
                BorderFactory.createEmptyBorder(1, 1, 1, 1)));
        requestFocusInWindow();
        selectAll();
    }

    private void end(boolean kept) {
        if (!isEditable()) {
            return;
        }
        String typed = getText().strip().replaceAll("\\s+", " ");
        reading();
        setText(words);
        if (kept && !typed.isEmpty() && !typed.equals(words)) {
            keep.accept(typed);
        }
        ended.run();
    }

    private void reading() {
        setEditable(false);
        setFocusable(false);
        setOpaque(false);
        setBorder(READ);
        select(0, 0);
    }
}
