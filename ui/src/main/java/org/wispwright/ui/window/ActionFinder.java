package org.wispwright.ui.window;

import java.awt.BorderLayout;
import java.awt.Component;
import java.awt.event.ActionEvent;
import java.awt.event.KeyEvent;
import java.awt.event.WindowAdapter;
import java.awt.event.WindowEvent;
import java.util.Locale;
import javax.swing.AbstractAction;
import javax.swing.Action;
import javax.swing.DefaultListCellRenderer;
import javax.swing.DefaultListModel;
import javax.swing.JComponent;
import javax.swing.JDialog;
import javax.swing.JList;
import javax.swing.JScrollPane;
import javax.swing.JTextField;
import javax.swing.KeyStroke;
import javax.swing.event.DocumentEvent;
import javax.swing.event.DocumentListener;

/** The list of all actions, narrowed by what is typed; Enter does the chosen one, Escape leaves. */
final class ActionFinder extends JDialog {
    private final ActionTable actions;
    private final JTextField typed = new JTextField(30);
    private final DefaultListModel<DeskAction> found = new DefaultListModel<>();
    private final JList<DeskAction> list = new JList<>(found);

    private ActionFinder(DeskWindow window) {
        super(window.frame(), Words.of("find.title"), false);
        actions = window.actions();
        setName("finder");
        typed.setName("finder-text");
        typed.getAccessibleContext().setAccessibleName(Words.of("find.title"));
        typed.putClientProperty("JTextField.placeholderText", Words.of("find.hint"));
        list.setName("finder-list");
        list.getAccessibleContext().setAccessibleName(Words.of("find.list"));
        list.setVisibleRowCount(14);
        list.setCellRenderer(new Row());
        list.setFocusable(false);
        typed.getDocument().addDocumentListener(new DocumentListener() {
            @Override
            public void insertUpdate(DocumentEvent e) {
                narrow();
            }

            @Override
            public void removeUpdate(DocumentEvent e) {
                narrow();
            }

            @Override
            public void changedUpdate(DocumentEvent e) {
                narrow();
            }
        });
        key("ENTER", this::take);
        key("ESCAPE", this::dispose);
        key("DOWN", () -> move(1));
        key("UP", () -> move(-1));
        list.addMouseListener(new java.awt.event.MouseAdapter() {
            @Override
            public void mouseClicked(java.awt.event.MouseEvent e) {
                take();
            }
        });
        add(typed, BorderLayout.NORTH);
        add(new JScrollPane(list), BorderLayout.CENTER);
        addWindowListener(new WindowAdapter() {
            @Override
            public void windowOpened(WindowEvent e) {
                typed.requestFocusInWindow();
            }
        });
        narrow();
        pack();
        setLocationRelativeTo(window.frame());
    }

    /** Opens the list over the window. */
    static void open(DeskWindow window) {
        new ActionFinder(window).setVisible(true);
    }

    private void key(String key, Runnable run) {
        typed.getInputMap(JComponent.WHEN_FOCUSED).put(KeyStroke.getKeyStroke(key), key);
        typed.getActionMap().put(key, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent e) {
                run.run();
            }
        });
    }

    private void narrow() {
        String[] parts = typed.getText().toLowerCase(Locale.ROOT).trim().split("\\s+");
        found.clear();
        for (DeskAction action : actions.all()) {
            String words = (actions.get(action.id()).getValue(Action.NAME) + " " + actions.get(action.id()).getValue(Action.SHORT_DESCRIPTION))
                    .toLowerCase(Locale.ROOT);
            boolean all = true;
            for (String part : parts) {
                all &= words.contains(part);
            }
            if (all && !action.id().equals("help.find")) {
                found.addElement(action);
            }
        }
        list.setSelectedIndex(found.isEmpty() ? -1 : 0);
    }

    private void move(int by) {
        if (!found.isEmpty()) {
            list.setSelectedIndex(Math.floorMod(list.getSelectedIndex() + by, found.size()));
            list.ensureIndexIsVisible(list.getSelectedIndex());
        }
    }

    private void take() {
        DeskAction chosen = list.getSelectedValue();
        if (chosen != null) {
            dispose();
            actions.get(chosen.id()).actionPerformed(new ActionEvent(this, KeyEvent.KEY_PRESSED, chosen.id()));
        }
    }

    private final class Row extends DefaultListCellRenderer {
        @Override
        public Component getListCellRendererComponent(JList<?> of, Object value, int index, boolean chosen, boolean focus) {
            DeskAction action = (DeskAction) value;
            Action swing = actions.get(action.id());
            String key = action.key() == null ? "" : "   " + Keys.inWords(action.key());
            super.getListCellRendererComponent(of, swing.getValue(Action.NAME) + key, index, chosen, focus);
            setEnabled(swing.isEnabled());
            setToolTipText(String.valueOf(swing.getValue(Action.SHORT_DESCRIPTION)));
            return this;
        }
    }
}
