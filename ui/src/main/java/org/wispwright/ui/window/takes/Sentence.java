package org.wispwright.ui.window.takes;

import java.awt.Color;
import java.awt.Dimension;
import java.awt.event.ComponentAdapter;
import java.awt.event.ComponentEvent;
import javax.swing.JTextArea;
import org.wispwright.ui.window.Palette;

/** Words that go on in the next line where the panel is narrow; hidden while there are none. */
final class Sentence extends JTextArea {
    private int laidOut;

    Sentence(String name) {
        setName(name);
        setEditable(false);
        setFocusable(false);
        setOpaque(false);
        setBorder(null);
        setLineWrap(true);
        setWrapStyleWord(true);
        setFont(Palette.small());
        setForeground(Palette.TEXT.colour());
        setVisible(false);
        addComponentListener(new ComponentAdapter() {
            @Override
            public void componentResized(ComponentEvent e) {
                if (getWidth() != laidOut) {                                   // another width has other lines: ask for their height
                    laidOut = getWidth();
                    revalidate();
                }
            }
        });
    }

    /** Shows words; none hides it. */
    void say(String words) {
        if (!getText().equals(words)) {
            setText(words);
        }
        getAccessibleContext().setAccessibleName(words);
        setVisible(!words.isEmpty());
    }

    /** The same in another colour. */
    Sentence in(Color colour) {
        setForeground(colour);
        return this;
    }

    @Override
    public Dimension getMinimumSize() {
        return new Dimension(0, getPreferredSize().height);
    }
}
