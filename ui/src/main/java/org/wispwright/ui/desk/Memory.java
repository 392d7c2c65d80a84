package org.wispwright.ui.desk;

import java.io.IOException;
import java.io.Reader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Properties;
import java.util.function.UnaryOperator;
import org.wispwright.render.files.WholeFile;

/**
 * Where {@link Remembered} lies between two starts: one small text file in the person's own settings folder. What cannot be read is forgotten,
 * and a disk that refuses only means that nothing is remembered: no work depends on it. One desk at a time writes it; the last wins.
 */
public final class Memory {
    private final Path file;
    private Remembered now;

    /** Reads what is there. @param file made when something is to be remembered */
    public Memory(Path file) {
        this.file = file;
        now = read();
    }

    /** The usual file: {@code wispwright/desk.properties} in the settings folder that the platform has for a person. */
    public static Path usual() {
        String os = System.getProperty("os.name", "").toLowerCase(Locale.ROOT);
        Path home = Path.of(System.getProperty("user.home", "."));
        String given = System.getenv(os.startsWith("windows") ? "APPDATA" : "XDG_CONFIG_HOME");
        Path settings = given != null && !given.isBlank() ? Path.of(given) : os.startsWith("windows") ? home.resolve("AppData/Roaming")
                : os.startsWith("mac") ? home.resolve("Library/Application Support") : home.resolve(".config");
        return settings.resolve("wispwright").resolve("desk.properties");
    }

    /** What is remembered. */
    public Remembered now() {
        return now;
    }

    /** Remembers something else. */
    public void change(UnaryOperator<Remembered> change) {
        Remembered next = change.apply(now);
        if (!next.equals(now)) {
            now = next;
            write();
        }
    }

    private Remembered read() {
        Properties p = new Properties();
        if (!Files.isRegularFile(file)) {
            return Remembered.NOTHING;
        }
        try (Reader in = Files.newBufferedReader(file, StandardCharsets.UTF_8)) {
            p.load(in);
            List<Path> recent = new ArrayList<>();
            for (int n = 0; n < Remembered.MOST_RECENT && p.containsKey("recent." + n); n++) {
                recent.add(Path.of(p.getProperty("recent." + n)));
            }
            Optional<List<Integer>> window = Optional.ofNullable(p.getProperty("window")).map(Memory::numbers);
            return new Remembered(recent, window, Boolean.parseBoolean(p.getProperty("dark", "true")),
                    Double.parseDouble(p.getProperty("textScale", "1")), Boolean.parseBoolean(p.getProperty("guided")),
                    Optional.ofNullable(p.getProperty("open")).map(Path::of));
        } catch (IOException | InvalidPathException | NumberFormatException damaged) {
            return Remembered.NOTHING;
        }
    }

    private static List<Integer> numbers(String text) {
        List<Integer> all = new ArrayList<>();
        for (String one : text.split(",")) {
            all.add(Integer.valueOf(one.trim()));
        }
        if (all.size() != 4) {
            throw new NumberFormatException(text);
        }
        return all;
    }

    private void write() {
        Properties p = new Properties();
        for (int n = 0; n < now.recent().size(); n++) {
            p.setProperty("recent." + n, now.recent().get(n).toString());
        }
        now.window().ifPresent(w -> p.setProperty("window", w.toString().replaceAll("[\\[\\] ]", "")));
        p.setProperty("dark", String.valueOf(now.dark()));
        p.setProperty("textScale", String.valueOf(now.textScale()));
        p.setProperty("guided", String.valueOf(now.guided()));
        now.open().ifPresent(o -> p.setProperty("open", o.toString()));
        try {
            Files.createDirectories(file.toAbsolutePath().getParent());
            java.io.StringWriter text = new java.io.StringWriter();
            p.store(text, "what the desk remembers");
            WholeFile.write(file, out -> out.write(text.toString().getBytes(StandardCharsets.UTF_8)));
        } catch (IOException refused) {
            return;                                                            // see above: nothing depends on it
        }
    }
}
