package org.wispwright.render.picture;

import java.awt.color.ColorSpace;
import java.awt.image.BufferedImage;
import java.awt.image.ColorModel;
import java.awt.image.DataBuffer;
import java.awt.image.IndexColorModel;
import java.awt.image.Raster;
import java.awt.image.WritableRaster;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Iterator;
import javax.imageio.IIOImage;
import javax.imageio.ImageIO;
import javax.imageio.ImageReader;
import javax.imageio.ImageTypeSpecifier;
import javax.imageio.ImageWriter;
import javax.imageio.metadata.IIOMetadata;
import javax.imageio.metadata.IIOMetadataNode;
import javax.imageio.stream.MemoryCacheImageInputStream;
import javax.imageio.stream.MemoryCacheImageOutputStream;
import org.wispwright.render.files.WholeFile;

/**
 * Pictures in PNG files (ISO/IEC 15948): sRGB coded, alpha not premultiplied in the file, premultiplied linear light here.
 * A file's own gamma or colour profile is not looked at: its codes are taken as sRGB.
 */
public final class PngFile {
    /** The largest file that is read, bytes. */
    public static final long MOST_BYTES = 1L << 30;

    private PngFile() {
    }

    /** Bits a channel in the file. */
    public enum Depth {
        /** 256 codes. */
        EIGHT(255, DataBuffer.TYPE_BYTE),
        /** 65536 codes. */
        SIXTEEN(65_535, DataBuffer.TYPE_USHORT);

        private final int largest;
        private final int dataType;

        Depth(int largest, int dataType) {
            this.largest = largest;
            this.dataType = dataType;
        }
    }

    /**
     * Reads grey, RGB or palette pixels of 1 to 16 bits, with alpha or without (then alpha is 1), interlaced or not.
     *
     * @throws PictureFileException if the file is not a PNG, damaged, cut short or larger than is read
     * @throws IOException if it is missing or closed to us
     */
    public static Picture read(Path path) throws IOException {
        if (!Files.isRegularFile(path)) {
            throw new PictureFileException(path, "does not exist; check the name");
        }
        long size = Files.size(path);
        if (size > MOST_BYTES) {
            throw new PictureFileException(path, "has " + size + " bytes, needs at most " + MOST_BYTES + "; save a smaller one");
        }
        byte[] bytes = Files.readAllBytes(path);
        PngCheck.require(path, bytes);
        BufferedImage image = decode(path, bytes);
        Picture picture = new Picture(image.getWidth(), image.getHeight());
        if (image.getColorModel() instanceof IndexColorModel palette) {
            fromPalette(image.getRaster(), palette, picture);
        } else {
            fromSamples(image.getRaster(), image.getColorModel().getComponentSize(0), picture);
        }
        return picture;
    }

    /**
     * Writes RGBA. Colours are divided by alpha, encoded, clipped to 0..1 and rounded; where alpha is 0 the pixel is clear
     * black, so light without cover is lost, as PNG cannot hold it. The file appears whole or not at all.
     *
     * @param path its folder must exist; an older file of that name is replaced
     * @throws IllegalArgumentException if a value is NaN or infinite
     * @throws IOException if the file cannot be written
     */
    public static void write(Picture picture, Path path, Depth depth) throws IOException {
        int width = picture.width();
        ImageTypeSpecifier type = ImageTypeSpecifier.createInterleaved(ColorSpace.getInstance(ColorSpace.CS_sRGB), new int[] {0, 1, 2, 3},
                depth.dataType, true, false);
        BufferedImage image = type.createBufferedImage(width, picture.height());
        WritableRaster raster = image.getRaster();
        int[] row = new int[4 * width];
        for (int y = 0; y < picture.height(); y++) {
            codeRow(picture, y, depth.largest, row, path);
            raster.setPixels(0, y, width, 1, row);
        }
        WholeFile.write(path, out -> encode(image, type, out));
    }

    private static BufferedImage decode(Path path, byte[] bytes) throws IOException {
        Iterator<ImageReader> readers = ImageIO.getImageReadersByFormatName("png");
        if (!readers.hasNext()) {
            throw new IOException("this Java has no PNG reader; use a full JDK or JRE 17 with the java.desktop module");
        }
        ImageReader reader = readers.next();
        try (MemoryCacheImageInputStream in = new MemoryCacheImageInputStream(new ByteArrayInputStream(bytes))) {
            // No metadata: text and profiles are not ours to judge.
            reader.setInput(in, true, true);
            return reader.read(0);
        } catch (IOException | RuntimeException wrong) {
            throw new PictureFileException(path, "is damaged: its pixels cannot be decoded (" + wrong.getMessage() + "); write the file again", wrong);
        } finally {
            reader.dispose();
        }
    }

    private static void fromPalette(Raster raster, ColorModel palette, Picture picture) {
        float[] rgba = picture.rgba();
        for (int y = 0, n = 0; y < picture.height(); y++) {
            for (int x = 0; x < picture.width(); x++, n += 4) {
                int argb = palette.getRGB(raster.getSample(x, y, 0));
                float alpha = (argb >>> 24) / 255f;
                rgba[n] = Srgb.decodeByte(argb >> 16 & 255) * alpha;
                rgba[n + 1] = Srgb.decodeByte(argb >> 8 & 255) * alpha;
                rgba[n + 2] = Srgb.decodeByte(argb & 255) * alpha;
                rgba[n + 3] = alpha;
            }
        }
    }

    /** Bands 1: grey; 2: grey and alpha; 3: RGB; 4: RGBA. The raster's codes, before any colour conversion of Java's. */
    private static void fromSamples(Raster raster, int bits, Picture picture) {
        int bands = raster.getNumBands();
        int largest = (1 << bits) - 1;
        float[] lights = new float[largest + 1];
        for (int code = 0; code <= largest; code++) {
            lights[code] = (float) Srgb.decode((double) code / largest);
        }
        boolean grey = bands < 3;
        boolean covered = bands == 1 || bands == 3;
        int[] row = new int[bands * picture.width()];
        float[] rgba = picture.rgba();
        for (int y = 0, n = 0; y < picture.height(); y++) {
            raster.getPixels(0, y, picture.width(), 1, row);
            for (int from = 0; from < row.length; from += bands, n += 4) {
                float alpha = covered ? 1 : (float) row[from + bands - 1] / largest;
                rgba[n] = lights[row[from]] * alpha;
                rgba[n + 1] = lights[row[grey ? from : from + 1]] * alpha;
                rgba[n + 2] = lights[row[grey ? from : from + 2]] * alpha;
                rgba[n + 3] = alpha;
            }
        }
    }

    private static void codeRow(Picture picture, int y, int largest, int[] row, Path path) {
        float[] rgba = picture.rgba();
        int first = 4 * picture.width() * y;
        for (int n = 0; n < row.length; n++) {
            if (!Float.isFinite(rgba[first + n])) {
                throw new IllegalArgumentException("picture for " + path + ": pixel (" + n / 4 + ", " + y + ") holds " + rgba[first + n]
                        + ", needs finite numbers; look for the first bad value where the picture was made");
            }
        }
        for (int n = 0; n < row.length; n += 4) {
            double alpha = Math.min(1, rgba[first + n + 3]);
            for (int c = 0; c < 3; c++) {
                row[n + c] = alpha > 0 ? Srgb.encodeTo(largest, rgba[first + n + c] / alpha) : 0;
            }
            row[n + 3] = alpha > 0 ? (int) (alpha * largest + 0.5) : 0;
        }
    }

    private static void encode(BufferedImage image, ImageTypeSpecifier type, OutputStream out) throws IOException {
        Iterator<ImageWriter> writers = ImageIO.getImageWritersByFormatName("png");
        if (!writers.hasNext()) {
            throw new IOException("this Java has no PNG writer; use a full JDK or JRE 17 with the java.desktop module");
        }
        ImageWriter writer = writers.next();
        try (MemoryCacheImageOutputStream stream = new MemoryCacheImageOutputStream(out)) {
            IIOMetadata metadata = writer.getDefaultImageMetadata(type, null);
            IIOMetadataNode root = new IIOMetadataNode("javax_imageio_png_1.0");
            IIOMetadataNode srgb = new IIOMetadataNode("sRGB");
            srgb.setAttribute("renderingIntent", "Perceptual");
            root.appendChild(srgb);
            metadata.mergeTree("javax_imageio_png_1.0", root);
            writer.setOutput(stream);
            writer.write(new IIOImage(image, null, metadata));
        } finally {
            writer.dispose();
        }
    }
}
