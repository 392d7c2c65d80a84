package org.wispwright.ui.window.easel;

import java.awt.BorderLayout;
import java.awt.Component;
import java.awt.Point;
import java.awt.event.ActionEvent;
import java.awt.event.WindowAdapter;
import java.awt.event.WindowEvent;
import java.util.List;
import javax.swing.AbstractAction;
import javax.swing.DefaultListModel;
import javax.swing.JButton;
import javax.swing.JComponent;
import javax.swing.JDialog;
import javax.swing.JList;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.KeyStroke;
import javax.swing.ListSelectionModel;
import javax.swing.SwingUtilities;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.ui.desk.Retouching.Edit;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.retouch.Operation;

/** The open note's operations in their order: each can be taken out, or done earlier or later. Not modal; Escape closes it. */
final class StepsWindow extends JDialog {
    private static final int ROWS = 8;

    private final Retouching retouching;
    private final DefaultListModel<String> lines = new DefaultListModel<>();
    private final JList<String> list = new JList<>(lines);
    private final JButton earlier = button("earlier", "alt UP", () -> move(-1));
    private final JButton later = button("later", "alt DOWN", () -> move(1));
    private final JButton remove = button("remove", "DELETE", this::remove);
    private List<Operation> shown = List.of();

    private StepsWindow(Component over, Desk desk, Retouching retouching) {
        super(SwingUtilities.getWindowAncestor(over), Words.of("steps.title"));
        this.retouching = retouching;
        setName("steps");
        setDefaultCloseOperation(DISPOSE_ON_CLOSE);
        list.setName("steps-list");
        list.getAccessibleContext().setAccessibleName(Words.of("steps.title"));
        list.setToolTipText(Words.of("steps.tip"));
        list.setVisibleRowCount(ROWS);
        list.setSelectionMode(ListSelectionModel.SINGLE_SELECTION);
        list.addListSelectionListener(e -> enableButtons());
        JPanel buttons = new JPanel(new MigLayout("insets 8", "[sg, fill][sg, fill][sg, fill]"));
        buttons.add(earlier);
        buttons.add(later);
        buttons.add(remove);
        add(new JScrollPane(list), BorderLayout.CENTER);
        add(buttons, BorderLayout.SOUTH);
        bind("ESCAPE", this::dispose);
        Runnable unlisten = desk.listen(this::follow);
        addWindowListener(new WindowAdapter() {
            @Override
            public void windowClosed(WindowEvent e) {
                unlisten.run();
            }
        });
        list.setSelectedIndex(lines.size() - 1);
        pack();
        Point corner = over.getLocationOnScreen();
        setLocation(corner.x + over.getWidth() - getWidth(), corner.y - getHeight());
    }

    /** Opens the list above a component. */
    static void open(Component over, Desk desk, Retouching retouching) {
        new StepsWindow(over, desk, retouching).setVisible(true);
    }

    private JButton button(String name, String key, Runnable run) {
        JButton button = new JButton(Words.of("steps." + name));
        button.setName("steps-" + name);
        button.setToolTipText(Words.of("steps." + name + ".tip"));
        button.addActionListener(e -> run.run());
        bind(key, run);
        return button;
    }

    private void bind(String key, Runnable run) {
        getRootPane().getInputMap(JComponent.WHEN_IN_FOCUSED_WINDOW).put(KeyStroke.getKeyStroke(key), key);
        getRootPane().getActionMap().put(key, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent e) {
                run.run();
            }
        });
    }

    private void follow(DeskState state) {
        List<Operation> operations = retouching.operations();
        if (operations == shown) {
            return;
        }
        shown = operations;
        int chosen = list.getSelectedIndex();
        lines.clear();
        for (int n = 0; n < operations.size(); n++) {
            lines.addElement(Words.of("steps.line", n + 1, Steps.inWords(operations.get(n))));
        }
        list.setSelectedIndex(Math.min(chosen, lines.size() - 1));
        enableButtons();
    }

    private void enableButtons() {
        int at = list.getSelectedIndex();
        earlier.setEnabled(at > 0);
        later.setEnabled(at >= 0 && at < lines.size() - 1);
        remove.setEnabled(at >= 0);
    }

    private void move(int by) {
        int from = list.getSelectedIndex();
        int to = from + by;
        if (from >= 0 && to >= 0 && to < lines.size()) {
            retouching.edit(Edit.MOVE_STEP, operations -> Steps.moved(operations, from, to));
            list.setSelectedIndex(to);
        }
    }

    private void remove() {
        int at = list.getSelectedIndex();
        if (at >= 0) {
            retouching.edit(Edit.REMOVE_STEP, operations -> Steps.without(operations, at));
        }
    }
}
