package org.wispwright.ui.window.takes;

import java.awt.Dimension;
import java.awt.Insets;
import java.awt.event.ComponentAdapter;
import java.awt.event.ComponentEvent;
import javax.swing.AbstractButton;
import javax.swing.JButton;
import javax.swing.JCheckBox;
import javax.swing.plaf.basic.BasicHTML;
import javax.swing.text.View;
import org.wispwright.ui.window.Palette;

/** Buttons whose words go on in the next line where they do not fit into one: large words in a narrow panel. */
final class Wordy {
    private Wordy() {
    }

    /** A push button. */
    static final class Push extends JButton {
        private final Fitted fitted = new Fitted(this);

        Push(String words) {
            setMargin(new Insets(2, Palette.STEP, 2, Palette.STEP));
            say(words);
        }

        /** Other words. */
        void say(String others) {
            fitted.say(others);
        }

        @Override
        public Dimension getPreferredSize() {
            return tall(this, super.getPreferredSize());
        }

        @Override
        public int getBaseline(int width, int height) {
            return -1;                                                         // it stands alone in its row
        }
    }

    /** A check box. */
    static final class Check extends JCheckBox {
        private final Fitted fitted = new Fitted(this);

        Check(String words) {
            say(words);
        }

        /** Other words. */
        void say(String others) {
            fitted.say(others);
        }

        @Override
        public Dimension getPreferredSize() {
            return tall(this, super.getPreferredSize());
        }

        @Override
        public int getBaseline(int width, int height) {
            return -1;                                                         // it stands alone in its row
        }
    }

    /** A button's words, fitted anew to every width that it gets. */
    private static final class Fitted extends ComponentAdapter {
        private final AbstractButton button;
        private String words = "";
        private int width;

        Fitted(AbstractButton button) {
            this.button = button;
            button.addComponentListener(this);
        }

        void say(String others) {
            if (!others.equals(words)) {
                words = others;
                button.getAccessibleContext().setAccessibleName(others);
                fit();
            }
        }

        @Override
        public void componentResized(ComponentEvent e) {
            if (button.getWidth() != width) {
                width = button.getWidth();
                fit();
                button.revalidate();
            }
        }

        private void fit() {
            boolean fits = button.getWidth() == 0 || button.getFontMetrics(button.getFont()).stringWidth(words) <= room(button);
            String text = fits ? words : "<html>" + words.replace("&", "&amp;").replace("<", "&lt;") + "</html>";
            if (!text.equals(button.getText())) {
                button.setText(text);
            }
        }
    }

    private static int room(AbstractButton button) {
        Insets around = button.getInsets();
        int mark = button instanceof JCheckBox ? button.getFontMetrics(button.getFont()).getHeight() + button.getIconTextGap() : 0;
        return Math.max(1, button.getWidth() - around.left - around.right - mark);
    }

    private static Dimension tall(AbstractButton button, Dimension usual) {
        if (!(button.getClientProperty(BasicHTML.propertyKey) instanceof View view)) {
            return usual;
        }
        view.setSize(room(button), 0);
        Insets around = button.getInsets();
        return new Dimension(usual.width, (int) Math.ceil(view.getPreferredSpan(View.Y_AXIS)) + around.top + around.bottom);
    }
}
