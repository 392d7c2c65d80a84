package org.wispwright.optimize.solve;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.DataInputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
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
 * <p>Layout, big-endian: the 8 bytes {@code WISPREC1}, the payload's length (int64), the payload ({@link #encoded}), its SHA-256 (32 bytes).
 */
public final class SolveRecords {
    /** Name of a record that stands alone. */
    public static final String ONLY = "record-0.bin";
    private static final byte[] MAGIC = {'W', 'I', 'S', 'P', 'R', 'E', 'C', '1'};
    private static final int DIGEST = 32;
    /** The most a record may weigh: 1 GiB. */
    private static final long MOST_BYTES = 1L << 30;

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
        byte[] payload = encoded(state);
        byte[] digest = digest(payload);
        WholeFile.write(file, out -> {
            out.write(MAGIC);
            out.write(ByteBuffer.allocate(Long.BYTES).putLong(payload.length).array());
            out.write(payload);
            out.write(digest);
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
                SolveState state = decoded(payload(file));
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

    private static byte[] payload(Path file) throws IOException, DamagedException {
        long size = Files.size(file);
        if (size > MOST_BYTES) {
            throw new DamagedException(size + " bytes, needs at most " + MOST_BYTES);
        }
        byte[] all = Files.readAllBytes(file);
        int head = MAGIC.length + Long.BYTES;
        if (all.length < head + DIGEST || !Arrays.equals(Arrays.copyOf(all, MAGIC.length), MAGIC)) {
            throw new DamagedException("does not begin as a record of this version does");
        }
        long length = ByteBuffer.wrap(all, MAGIC.length, Long.BYTES).getLong();
        if (length != all.length - head - DIGEST) {
            throw new DamagedException("is cut short or grown: " + all.length + " bytes");
        }
        byte[] payload = Arrays.copyOfRange(all, head, all.length - DIGEST);
        if (!Arrays.equals(digest(payload), Arrays.copyOfRange(all, all.length - DIGEST, all.length))) {
            throw new DamagedException("its digest does not fit, so some of its bytes have changed");
        }
        return payload;
    }

    /** The fields of a {@link SolveState} in their order: numbers as they are, texts as modified UTF-8, lists after their length. */
    static byte[] encoded(SolveState state) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (DataOutputStream out = new DataOutputStream(bytes)) {
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
        }
        return bytes.toByteArray();
    }

    private static SolveState decoded(byte[] payload) throws DamagedException {
        try (DataInputStream in = new DataInputStream(new ByteArrayInputStream(payload))) {
            SolveState state = new SolveState(in.readUTF(), in.readInt(), in.readInt(), in.readInt(), in.readInt(), in.readDouble(),
                    in.readDouble(), readSearch(in), readList(in), readList(in), readRuns(in), in.readUTF());
            if (in.available() > 0) {
                throw new DamagedException("has more in it than a record of this version");
            }
            return state;
        } catch (IOException | IllegalArgumentException wrong) {
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

    private static Lbfgs.State readSearch(DataInputStream in) throws IOException {
        double[] x = readArray(in);
        double value = in.readDouble();
        double[] gradient = readArray(in);
        double quadratic = in.readDouble();
        int pairs = count(in, 2 * Integer.BYTES);
        double[][] s = new double[pairs][];
        double[][] y = new double[pairs][];
        for (int n = 0; n < pairs; n++) {
            s[n] = readArray(in);
            y[n] = readArray(in);
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

    private static List<SolveResult.BandRun> readRuns(DataInputStream in) throws IOException {
        List<SolveResult.BandRun> runs = new ArrayList<>();
        for (int n = count(in, Long.BYTES); n > 0; n--) {
            GridShape grid = new GridShape(in.readInt(), in.readInt(), in.readInt(), in.readDouble(), in.readDouble(), in.readDouble(),
                    in.readDouble());
            Band band = new Band(in.readDouble(), in.readDouble(), in.readInt());
            runs.add(new SolveResult.BandRun(grid, band, in.readInt(), in.readInt(), in.readInt(), in.readDouble(), in.readDouble()));
        }
        return runs;
    }

    private static void write(DataOutputStream out, double[] values) throws IOException {
        out.writeInt(values.length);
        ByteBuffer bytes = ByteBuffer.allocate(values.length * Double.BYTES);
        bytes.asDoubleBuffer().put(values);
        out.write(bytes.array());
    }

    private static double[] readArray(DataInputStream in) throws IOException {
        double[] values = new double[count(in, Double.BYTES)];
        byte[] bytes = in.readNBytes(values.length * Double.BYTES);
        ByteBuffer.wrap(bytes).asDoubleBuffer().get(values);
        return values;
    }

    private static void write(DataOutputStream out, List<Double> values) throws IOException {
        write(out, values.stream().mapToDouble(Double::doubleValue).toArray());
    }

    private static List<Double> readList(DataInputStream in) throws IOException {
        return Arrays.stream(readArray(in)).boxed().toList();
    }

    /** A length, refused if what follows cannot hold so many entries. */
    private static int count(DataInputStream in, int bytesEach) throws IOException {
        int count = in.readInt();
        if (count < 0 || count > in.available() / bytesEach) {
            throw new IOException("a list of " + count + " entries in " + in.available() + " bytes");
        }
        return count;
    }

    private static byte[] digest(byte[] bytes) {
        try {
            return MessageDigest.getInstance("SHA-256").digest(bytes);
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException(impossible);
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
