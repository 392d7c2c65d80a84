package org.wispwright.ui.window.start;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import javax.swing.JTextField;
import org.wispwright.ui.shot.ShotDraft;
import org.wispwright.ui.window.Words;

/** The fields of the guided set-up, each with a value that works, and the shot that they say. */
final class BeginFields {
    private final Map<String, Field> fields = new LinkedHashMap<>();

    /**
     * A field.
     *
     * @param page its page
     * @param key  its words are {@code begin.KEY}
     * @param text where it is typed
     */
    record Field(String page, String key, JTextField text) {
        boolean isPath() {
            return key.equals("below") || key.equals("frames") || key.equals("start");
        }
    }

    BeginFields() {
        add("have", "title", "My shot");
        add("have", "below", Path.of(System.getProperty("user.home", "."), "Wispwright").toString());
        add("have", "frames", "");
        add("have", "start", "");
        add("box", "first", "1001");
        add("box", "last", "1048");
        add("box", "rate", "24");
        add("box", "cells", "48 64 48");
        add("box", "cell", "0.1");
        add("camera", "view", "front");
        add("camera", "focal", "50");
        add("camera", "gate", "36");
        add("camera", "position", "2.4 3.2 13");
        add("camera", "aim", "2.4 3.2 2.4");
        add("camera", "raster", "960 540");
        add("smoke", "source", "2.4 0.6 2.4");
        add("smoke", "radius", "0.5");
        add("smoke", "strength", "5");
        add("smoke", "buoyancy", "12");
        add("smoke", "dissipation", "0.15");
        add("smoke", "extinction", "3");
    }

    private void add(String page, String key, String value) {
        JTextField text = new JTextField(value);
        text.setName("begin-" + key);
        text.getAccessibleContext().setAccessibleName(Words.of("begin." + key));
        text.setToolTipText(Words.of("begin." + key + ".tip"));
        fields.put(key, new Field(page, key, text));
    }

    List<Field> of(String page) {
        return fields.values().stream().filter(field -> field.page().equals(page)).toList();
    }

    String text(String key) {
        return fields.get(key).text().getText().strip();
    }

    void set(String key, String value) {
        fields.get(key).text().setText(value);
    }

    /** @throws IllegalArgumentException with one sentence if a field does not hold what it must */
    ShotDraft draft(SortedMap<Integer, Path> frames) {
        List<Integer> cells = new ArrayList<>();
        numbers("cells", 3).forEach(n -> cells.add(n.intValue()));
        List<Double> raster = numbers("raster", 2);
        Optional<Path> start = text("start").isBlank() ? Optional.empty() : Optional.of(Path.of(text("start")));
        Optional<ShotDraft.Source> source = text("source").isBlank() ? Optional.empty()
                : Optional.of(new ShotDraft.Source(numbers("source", 3), number("radius"), number("strength")));
        ShotDraft.Camera camera = new ShotDraft.Camera(text("view"), number("focal"), number("gate"), numbers("position", 3),
                numbers("aim", 3), raster.get(0).intValue(), raster.get(1).intValue());
        return new ShotDraft(text("title"), (int) number("first"), (int) number("last"), number("rate"), cells, number("cell"), source,
                number("buoyancy"), number("dissipation"), number("extinction"), camera, frames, start);
    }

    private double number(String key) {
        return numbers(key, 1).get(0);
    }

    private List<Double> numbers(String key, int count) {
        List<Double> all = new ArrayList<>();
        try {
            for (String part : text(key).split("[\\s,;x]+")) {
                all.add(Double.valueOf(part));
            }
        } catch (NumberFormatException none) {
            all.clear();
        }
        if (all.size() != count) {
            throw new IllegalArgumentException(Words.of("begin.wrong", Words.of("begin." + key), text(key), count));
        }
        return all;
    }
}
