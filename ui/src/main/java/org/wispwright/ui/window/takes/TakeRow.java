package org.wispwright.ui.window.takes;

import java.awt.Component;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.awt.geom.Path2D;
import java.nio.file.attribute.FileTime;
import java.time.ZoneId;
import java.time.format.DateTimeFormatter;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import javax.swing.BorderFactory;
import javax.swing.Icon;
import javax.swing.JPanel;
import javax.swing.JToggleButton;
import javax.swing.SwingConstants;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.desk.TakeEntry;
import org.wispwright.ui.shot.MemoryNeed;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** A take in the list: which it is, where it comes from, how far it meets the notes it was solved for; it can be shown, or set against. */
final class TakeRow extends JPanel {
    private static final DateTimeFormatter WHEN = DateTimeFormatter.ofPattern("d MMM, HH:mm", Locale.ENGLISH)
            .withZone(ZoneId.systemDefault());

    private final JToggleButton show = new JToggleButton();
    private final JToggleButton against = new JToggleButton();
    private final Sentence from;
    private final MetBar met = new MetBar();

    TakeRow(Desk desk, int number) {
        super(new MigLayout("insets 4 8 4 8, fillx, hidemode 3, gapy 2", "[grow,fill]4[]"));
        setName("take-row-" + number);
        setBackground(Palette.CARD.colour());
        from = new Sentence("take-" + number + "-from").in(Palette.QUIET.colour());
        met.setName("take-" + number + "-met");
        show.setName("take-" + number);
        show.setHorizontalAlignment(SwingConstants.LEFT);
        show.putClientProperty("JButton.buttonType", "toolBarButton");
        show.addActionListener(e -> desk.show(s -> s.withNear(new Source.Take(number))));
        against.setName("take-" + number + "-against");
        against.putClientProperty("JButton.buttonType", "toolBarButton");
        against.setFont(Palette.small());
        against.addActionListener(e -> desk.show(s -> s.withFar(new Source.Take(number))));
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent e) {
                if (show.isEnabled()) {
                    show.doClick(0);
                }
            }
        });
        add(show, "wmin 0");
        add(against, "wrap");
        add(from, "span, wmin 0, wrap");
        add(met, "span, growx, wmin 0");
    }

    /** Brings it up to a take and to what is shown. */
    void follow(TakeEntry take, Showing showing) {
        String name = take.number() == 0 ? Words.of("takes.original") : Words.of("takes.take", take.number());
        boolean shown = showing.near().equals(new Source.Take(take.number()));
        boolean far = showing.far().equals(new Source.Take(take.number()));
        show.setText(name);
        show.setIcon(new ShownMark(shown, getFontMetrics(getFont()).getAscent()));
        show.setSelected(shown);
        show.setEnabled(take.current());
        show.setFont(shown ? Palette.strong() : getFont());
        String tip = take.current() ? Words.of("takes.show.tip", name) : Words.of("takes.other-set-up.tip");
        show.setToolTipText(tip);
        show.getAccessibleContext().setAccessibleName(shown ? Words.of("takes.shown", name) : name);
        show.getAccessibleContext().setAccessibleDescription(tip);
        against.setText(Words.of(far ? "takes.against.is" : "takes.against"));
        against.setSelected(far);
        against.setEnabled(take.current());
        against.setToolTipText(Words.of("takes.against.tip", name));
        against.getAccessibleContext().setAccessibleName(Words.of("takes.against.tip", name));
        from.say(from(take));
        met.setVisible(!take.met().isEmpty());
        Map<String, Double> inOrder = new TreeMap<>(take.met());
        take.leastMet().ifPresent(least -> {
            met.show(Words.of(take.met().size() == 1 ? "takes.met.one" : "takes.met.least"), least);
            StringBuilder all = new StringBuilder();
            inOrder.forEach((note, share) -> all.append(all.isEmpty() ? "" : ", ").append(note).append(' ').append(Amounts.percent(share)));
            met.setToolTipText(Words.of("takes.met.all", all));
        });
        setBorder(BorderFactory.createMatteBorder(0, Palette.STEP, 0, 0, (shown ? Palette.ACCENT : Palette.CARD).colour()));
    }

    /** A wedge that points at what is shown, or its room. @param size of it, pixels */
    private record ShownMark(boolean shown, int size) implements Icon {
        @Override
        public void paintIcon(Component c, Graphics g, int x, int y) {
            if (shown) {
                Graphics2D on = (Graphics2D) g.create();
                on.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
                on.setColor(Palette.ACCENT.colour());
                Path2D wedge = new Path2D.Double();
                wedge.moveTo(x + 0.2 * size, y + 0.1 * size);
                wedge.lineTo(x + 0.8 * size, y + 0.5 * size);
                wedge.lineTo(x + 0.2 * size, y + 0.9 * size);
                wedge.closePath();
                on.fill(wedge);
                on.dispose();
            }
        }

        @Override
        public int getIconWidth() {
            return size;
        }

        @Override
        public int getIconHeight() {
            return size;
        }
    }

    private static String from(TakeEntry take) {
        if (!take.current()) {
            return Words.of("takes.other-set-up", size(take));
        }
        if (take.number() == 0) {
            return Words.of("takes.from.original", when(take.made()), size(take));
        }
        String quality = take.quality().map(q -> Words.has("takes.quality." + q) ? Words.of("takes.quality." + q) : q).orElse("")
                .toLowerCase(Locale.ROOT);
        return take.parent().isPresent() ? Words.of("takes.from.take", take.parent().getAsInt(), quality, when(take.made()), size(take))
                : Words.of("takes.from.none", quality, when(take.made()), size(take));
    }

    private static String size(TakeEntry take) {
        return MemoryNeed.inWords(take.bytes());
    }

    private static String when(FileTime made) {
        return WHEN.format(made.toInstant());
    }
}
