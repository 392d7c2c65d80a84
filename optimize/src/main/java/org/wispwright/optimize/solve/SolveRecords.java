package org.wispwright.optimize.solve;

import java.io.BufferedInputStream;
import java.io.DataInputStream;
import java.io.DataOutputStream;
import java.io.EOFException;
import java.io.FilterInputStream;
import java.io.FilterOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.security.DigestOutputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.wispwright.optimize.force.Band;
import org.wispwright.optimize.search.Lbfgs;
import org.wispwright.render.files.WholeFile;
import org.wispwright.render.volume.GridShape;

/**
 * The records of a running solve: two files in one folder, written in turn, so that whatever happens to the newer one the older
 * is there. Each appears whole or not at all, and says by its digest if a single bit of it has changed since.
 * <p>Layout, big-endian: the 8 bytes {@code WISPREC1}, the payload's length (int64), the payload ({@link #encode}), its SHA-256 (32 bytes).
 */
public final class SolveRecords {
    /** Name of a record that stands alone. */
    public static final String ONLY = "record-0.bin";
    private static final byte[] MAGIC = {'W', 'I', 'S', 'P', 'R', 'E', 'C', '1'};
    private static final int DIGEST = 32;
    private static final int HEAD = 8 + Long.BYTES;
    /** Numbers that go through the buffer at a time. */
    private static final int CHUNK = 1 << 13;

    private final Path folder;

    /** Records in a folder that is there. */
    public SolveRecords(Path folder) {
        this.folder = folder;
    }

    /**
     * What was found.
     *
     * @param state   of the newest record that is whole; empty if there is none
     * @param damaged names of records that are not, each with what is wrong
     */
    public record Found(Optional<SolveState> state, List<String> damaged) {
        /** Copies the list. */
        public Found {
            damaged = List.copyOf(damaged);
        }
    }

    /**
     * Writes a state over the older of the two records.
     *
     * @throws IOException if the disk refuses; both records are then as they were
     */
    public void write(SolveState state) throws IOException {
        write(state, file(state.search().iterations() % 2));
    }

    /** Writes a state as the folder's only record, {@value #ONLY}. @throws IOException if the disk refuses */
    public void writeOnly(SolveState state) throws IOException {
        write(state, file(0));
    }

    private static void write(SolveState state, Path file) throws IOException {
        Counted length = new Counted(OutputStream.nullOutputStream());
        encode(state, length);
        WholeFile.write(file, out -> {
            out.write(MAGIC);
            out.write(ByteBuffer.allocate(Long.BYTES).putLong(length.bytes).array());
            DigestOutputStream digested = new DigestOutputStream(out, sha256());
            encode(state, digested);
            out.write(digested.getMessageDigest().digest());
        });
    }

    /** The newest state that can be gone on with. @throws IOException if a record is there and cannot be read at all */
    public Found latest() throws IOException {
        Optional<SolveState> newest = Optional.empty();
        List<String> damaged = new ArrayList<>();
        for (int n = 0; n < 2; n++) {
            Path file = file(n);
            if (!Files.exists(file, LinkOption.NOFOLLOW_LINKS)) {
                continue;
            }
            try {
                SolveState state = read(file);
                if (newest.isEmpty() || newest.get().search().iterations() < state.search().iterations()) {
                    newest = Optional.of(state);
                }
            } catch (DamagedException wrong) {
                damaged.add(file.getFileName() + ": " + wrong.getMessage());
            }
        }
        return new Found(newest, damaged);
    }

    /** Removes both records. */
    public void clear() throws IOException {
        for (int n = 0; n < 2; n++) {
            Files.deleteIfExists(file(n));
        }
    }

    private Path file(int n) {
        return folder.resolve("record-" + n + ".bin");
    }

    /** Goes through the file twice, first for its digest: no number of a record is believed before all of it is known to be whole. */
    private static SolveState read(Path file) throws IOException, DamagedException {
        long size = Files.size(file);
        long length = size - HEAD - DIGEST;
        try (InputStream in = new BufferedInputStream(Files.newInputStream(file), 1 << 16)) {
            byte[] head = in.readNBytes(HEAD);
            if (length < 0 || head.length < HEAD || !Arrays.equals(Arrays.copyOf(head, MAGIC.length), MAGIC)) {
                throw new DamagedException("does not begin as a record of this version does");
            }
            if (ByteBuffer.wrap(head, MAGIC.length, Long.BYTES).getLong() != length) {
                throw new DamagedException("is cut short or grown: " + size + " bytes");
            }
            MessageDigest digest = sha256();
            byte[] some = new byte[1 << 16];
            for (long left = length; left > 0;) {
                int count = in.readNBytes(some, 0, (int) Math.min(left, some.length));
                if (count == 0) {
                    throw new DamagedException("is cut short");
                }
                digest.update(some, 0, count);
                left -= count;
            }
            if (!Arrays.equals(digest.digest(), in.readNBytes(DIGEST))) {
                throw new DamagedException("its digest does not fit, so some of its bytes have changed");
            }
        }
        try (InputStream in = new BufferedInputStream(Files.newInputStream(file), 1 << 16)) {
            in.skipNBytes(HEAD);
            return decoded(in, length);
        }
    }

    /** The fields of a {@link SolveState} in their order: numbers as they are, texts as modified UTF-8, lists after their length. */
    static void encode(SolveState state, OutputStream to) throws IOException {
        DataOutputStream out = new DataOutputStream(to);
        out.writeUTF(state.problem());
        out.writeInt(state.rung());
        out.writeInt(state.band());
        out.writeInt(state.bandIterations());
        out.writeInt(state.bandGradients());
        out.writeDouble(state.bandSeconds());
        out.writeDouble(state.seconds());
        write(out, state.search());
        write(out, state.losses());
        write(out, state.met());
        out.writeInt(state.runs().size());
        for (SolveResult.BandRun run : state.runs()) {
            write(out, run);
        }
        out.writeUTF(state.ended());
        out.flush();
    }

    private static SolveState decoded(InputStream from, long length) throws IOException, DamagedException {
        Rest rest = new Rest(from, length);
        DataInputStream in = new DataInputStream(rest);
        try {
            SolveState state = new SolveState(in.readUTF(), in.readInt(), in.readInt(), in.readInt(), in.readInt(), in.readDouble(),
                    in.readDouble(), readSearch(in, rest), readList(in, rest), readList(in, rest), readRuns(in, rest), in.readUTF());
            if (rest.left > 0) {
                throw new DamagedException("has more in it than a record of this version");
            }
            return state;
        } catch (IllegalArgumentException | EOFException wrong) {
            throw new DamagedException("cannot be understood (" + wrong.getMessage() + ")");
        }
    }

    private static void write(DataOutputStream out, Lbfgs.State search) throws IOException {
        write(out, search.x());
        out.writeDouble(search.value());
        write(out, search.gradient());
        out.writeDouble(search.quadratic());
        out.writeInt(search.s().length);
        for (int n = 0; n < search.s().length; n++) {
            write(out, search.s()[n]);
            write(out, search.y()[n]);
        }
        out.writeInt(search.iterations());
        out.writeInt(search.evaluations());
        out.writeDouble(search.lastMoved());
    }

    private static Lbfgs.State readSearch(DataInputStream in, Rest rest) throws IOException {
        double[] x = readArray(in, rest);
        double value = in.readDouble();
        double[] gradient = readArray(in, rest);
        double quadratic = in.readDouble();
        int pairs = count(in, rest, 2 * Integer.BYTES);
        double[][] s = new double[pairs][];
        double[][] y = new double[pairs][];
        for (int n = 0; n < pairs; n++) {
            s[n] = readArray(in, rest);
            y[n] = readArray(in, rest);
        }
        return new Lbfgs.State(x, value, gradient, quadratic, s, y, in.readInt(), in.readInt(), in.readDouble());
    }

    private static void write(DataOutputStream out, SolveResult.BandRun run) throws IOException {
        GridShape g = run.grid();
        for (int n : new int[] {g.nx(), g.ny(), g.nz()}) {
            out.writeInt(n);
        }
        for (double v : new double[] {g.cellMetres(), g.originX(), g.originY(), g.originZ(), run.band().low(), run.band().high()}) {
            out.writeDouble(v);
        }
        out.writeInt(run.band().splines());
        out.writeInt(run.unknowns());
        out.writeInt(run.iterations());
        out.writeInt(run.gradients());
        out.writeDouble(run.loss());
        out.writeDouble(run.seconds());
    }

    private static List<SolveResult.BandRun> readRuns(DataInputStream in, Rest rest) throws IOException {
        List<SolveResult.BandRun> runs = new ArrayList<>();
        for (int n = count(in, rest, Long.BYTES); n > 0; n--) {
            GridShape grid = new GridShape(in.readInt(), in.readInt(), in.readInt(), in.readDouble(), in.readDouble(), in.readDouble(),
                    in.readDouble());
            Band band = new Band(in.readDouble(), in.readDouble(), in.readInt());
            runs.add(new SolveResult.BandRun(grid, band, in.readInt(), in.readInt(), in.readInt(), in.readDouble(), in.readDouble()));
        }
        return runs;
    }

    private static void write(DataOutputStream out, double[] values) throws IOException {
        out.writeInt(values.length);
        ByteBuffer bytes = ByteBuffer.allocate(CHUNK * Double.BYTES);
        for (int from = 0; from < values.length; from += CHUNK) {
            int count = Math.min(CHUNK, values.length - from);
            bytes.asDoubleBuffer().put(values, from, count);
            out.write(bytes.array(), 0, count * Double.BYTES);
        }
    }

    private static double[] readArray(DataInputStream in, Rest rest) throws IOException {
        double[] values = new double[count(in, rest, Double.BYTES)];
        ByteBuffer bytes = ByteBuffer.allocate(CHUNK * Double.BYTES);
        for (int from = 0; from < values.length; from += CHUNK) {
            int count = Math.min(CHUNK, values.length - from);
            in.readFully(bytes.array(), 0, count * Double.BYTES);
            bytes.asDoubleBuffer().get(values, from, count);
        }
        return values;
    }

    private static void write(DataOutputStream out, List<Double> values) throws IOException {
        write(out, values.stream().mapToDouble(Double::doubleValue).toArray());
    }

    private static List<Double> readList(DataInputStream in, Rest rest) throws IOException {
        return Arrays.stream(readArray(in, rest)).boxed().toList();
    }

    /** A length, refused if what follows cannot hold so many entries. */
    private static int count(DataInputStream in, Rest rest, int bytesEach) throws IOException {
        int count = in.readInt();
        if (count < 0 || count > rest.left / bytesEach) {
            throw new EOFException("a list of " + count + " entries in " + rest.left + " bytes");
        }
        return count;
    }

    private static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException(impossible);
        }
    }

    /** Counts what goes through. */
    private static final class Counted extends FilterOutputStream {
        private long bytes;

        Counted(OutputStream out) {
            super(out);
        }

        @Override
        public void write(int one) throws IOException {
            bytes++;
        }

        @Override
        public void write(byte[] some, int from, int count) throws IOException {
            bytes += count;
        }
    }

    /** The rest of a payload: knows how much of it is left, and ends with it. */
    private static final class Rest extends FilterInputStream {
        private long left;

        Rest(InputStream in, long length) {
            super(in);
            left = length;
        }

        @Override
        public int read() throws IOException {
            int one = left > 0 ? super.read() : -1;
            left -= one < 0 ? 0 : 1;
            return one;
        }

        @Override
        public int read(byte[] some, int from, int count) throws IOException {
            int got = left > 0 ? super.read(some, from, (int) Math.min(left, count)) : -1;
            left -= Math.max(0, got);
            return got;
        }
    }

    /** A record that cannot be gone on with. */
    private static final class DamagedException extends Exception {
        private static final long serialVersionUID = 1L;

        DamagedException(String what) {
            super(what);
        }
    }
}
