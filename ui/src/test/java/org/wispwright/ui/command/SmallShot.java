package org.wispwright.ui.command;

import java.awt.image.BufferedImage;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Stream;
import javax.imageio.ImageIO;

/** A shot folder small enough for a test, with everything in it: two views, a rendered frame, two notes, a hold. */
public final class SmallShot {
    static final String SETUP = """
            {
              "wispwright": 1,
              "name": "Small yard",
              "grid": {"cells": [8, 16, 8], "cellMetres": 0.25, "originMetres": [0, 0, 0]},
              "frames": {"first": 1001, "last": 1006, "perSecond": 24},
              "flow": {
                "substeps": 1, "velocityInterpolation": "cubic",
                "sides": {"left": "open", "right": "open", "floor": "wall", "top": "open", "back": "open", "front": "open"},
                "buoyancy": 3.0, "dissipation": 0.1
              },
              "sources": [
                {"name": "kiln mouth", "centreMetres": [1, 0.6, 1], "radiusMetres": 0.5, "edgeMetres": 0.25, "ratePerSecond": 6,
                 "frames": [1001, 1006]}
              ],
              "look": {
                "extinctionPerMetre": 6, "albedo": [0.8, 0.8, 0.8], "ambient": [0.4, 0.4, 0.4],
                "light": {"towards": [1, 2, 1], "radiance": [0.9, 0.9, 0.9]}
              },
              "background": [0.1, 0.14, 0.2],
              "views": [
                {
                  "name": "front", "lens": {"focalMm": 50, "gateMm": [27, 36]},
                  "positionMetres": [1, 2, 8], "aimMetres": [1, 2, 1], "up": [0, 1, 0], "raster": [48, 64],
                  "rendered": {"1004": "frames/front.1004.png"}
                },
                {
                  "name": "side", "lens": {"orthographicMetres": [3, 4]},
                  "positionMetres": [8, 2, 1], "aimMetres": [1, 2, 1], "raster": [48, 64]
                }
              ]
            }
            """;
    static final String LEAN = """
            {
              "wispwright": 1, "words": "Lean the head to the left.", "frame": 1004, "view": "front", "weight": 1,
              "retouch": [
                {"meshWarp": {"handles": [{"from": [0.37, 0.8], "to": [0.31, 0.8]}, {"pin": [0.3, 0.98]}, {"pin": [0.45, 0.98]}]}}
              ],
              "holds": [{"region": {"rectangle": {"left": 0.2, "top": 0.8, "right": 0.6, "bottom": 1}, "feather": 0.05}}]
            }
            """;
    static final String OPEN = """
            {
              "wispwright": 1, "words": "Open a gap.", "frame": 1006, "view": "side",
              "retouch": [
                {"stroke": {"brush": "remove", "radius": 0.1, "strength": 0.9, "softEdge": 0.5, "line": [[0.33, 0.82], [0.42, 0.82]]}},
                {"stroke": {"brush": "add", "radius": 0.05, "line": [[0.5, 0.6]]}}
              ],
              "holds": [{"region": {"ellipse": {"centre": [0.37, 0.9], "radii": [0.1, 0.05]}}, "frames": [1003, 1006]}]
            }
            """;

    private final Path folder;

    private SmallShot(Path folder) {
        this.folder = folder;
    }

    /** Writes the shot. */
    public static SmallShot in(Path folder) {
        SmallShot shot = new SmallShot(folder);
        shot.write("shot.json", SETUP);
        shot.write("notes/lean.json", LEAN);
        shot.write("notes/open.json", OPEN);
        shot.writePng("frames/front.1004.png", 96, 128);
        return shot;
    }

    /** The folder. */
    public Path folder() {
        return folder;
    }

    void write(String file, String text) {
        write(file, text.getBytes(StandardCharsets.UTF_8));
    }

    void write(String file, byte[] bytes) {
        try {
            Path path = folder.resolve(file);
            Files.createDirectories(path.getParent());
            Files.write(path, bytes);
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        }
    }

    /** Swaps a piece of a file's text for another; fails if the piece is not there. */
    public void swap(String file, String old, String now) {
        try {
            String text = Files.readString(folder.resolve(file));
            if (!text.contains(old)) {
                throw new IllegalArgumentException(file + " has no '" + old + "'");
            }
            write(file, text.replace(old, now));
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        }
    }

    void delete(String file) {
        try {
            Files.delete(folder.resolve(file));
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        }
    }

    void writePng(String file, int width, int height) {
        BufferedImage image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
        for (int y = 0; y < height; y++) {
            for (int x = 0; x < width; x++) {
                image.setRGB(x, y, 0x101010 * (1 + (x * 7 + y * 3) % 13));
            }
        }
        try {
            Path path = folder.resolve(file);
            Files.createDirectories(path.getParent());
            ImageIO.write(image, "png", path.toFile());
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        }
    }

    /** Everything under a folder: relative path to SHA-256 of its bytes ("folder" for folders). */
    public static SortedMap<String, String> listing(Path root) {
        SortedMap<String, String> all = new TreeMap<>();
        try (Stream<Path> paths = Files.walk(root)) {
            List<Path> list = paths.toList();
            for (Path path : list) {
                String sum = Files.isRegularFile(path) ? HexFormat.of()
                        .formatHex(MessageDigest.getInstance("SHA-256").digest(Files.readAllBytes(path))) : "folder";
                all.put(root.relativize(path).toString(), sum);
            }
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException(impossible);
        }
        return all;
    }
}
