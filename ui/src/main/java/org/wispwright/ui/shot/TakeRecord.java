package org.wispwright.ui.shot;

import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.SerializationFeature;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.Pace;

/**
 * Where a take comes from, as {@code take.json} says it.
 *
 * @param kind what made it
 * @param tool version of the program that made it
 * @param setupSha256 digest of the simulation's set-up, see {@link #digest}: tells whether a take still belongs to the shot
 * @param settings what the person or the program chose; free names
 * @param figures what was measured; free names, finite numbers
 * @param losses the loss after every iteration, the start first; empty for the original
 */
public record TakeRecord(Kind kind, String tool, String setupSha256, ObjectNode settings, ObjectNode figures, List<Double> losses) {
    static final String SUBSTEPS = "substeps";
    private static final JsonMapper MAPPER = JsonMapper.builder().enable(SerializationFeature.INDENT_OUTPUT).build();

    /** What made a take. */
    public enum Kind {
        /** The simulation without extra force. */
        ORIGINAL,
        /** A search for a force. */
        SOLVE
    }

    /** Keeps copies. @throws IllegalArgumentException if a loss is not a finite number */
    public TakeRecord {
        settings = settings.deepCopy();
        figures = figures.deepCopy();
        losses = List.copyOf(losses);
        if (losses.stream().anyMatch(loss -> !Double.isFinite(loss))) {
            throw new IllegalArgumentException("take: got a loss that is not a finite number; the solve must not be kept");
        }
    }

    /** The record of an original. @param cells how far air moved in a substep */
    public static TakeRecord original(String tool, FlowSetup flow, double cells) {
        ObjectNode figures = object().put(SUBSTEPS, flow.substeps()).put("largestDisplacementCells", cells);
        return new TakeRecord(Kind.ORIGINAL, tool, digest(flow), object(), figures, List.of());
    }

    /** The number of substeps that an original was made with; empty if its figures have none that can be. */
    Optional<Integer> substeps() {
        int number = figures.path(SUBSTEPS).isInt() ? figures.path(SUBSTEPS).intValue() : 0;
        return number >= 1 && number <= Pace.MOST_SUBSTEPS ? Optional.of(number) : Optional.empty();
    }

    /** An empty JSON object for settings or figures. */
    public static ObjectNode object() {
        return JsonNodeFactory.instance.objectNode();
    }

    /** See {@link SetupDigest}. */
    public static String digest(FlowSetup flow) {
        return SetupDigest.of(flow);
    }

    /** True if the take was made with this set-up. */
    public boolean belongsTo(FlowSetup flow) {
        return setupSha256.equals(digest(flow));
    }

    /** As the bytes of take.json. */
    byte[] json(int number) {
        ObjectNode top = object().put("wispwright", SetupReader.FORMAT).put("take", number).put("kind", JsonPlace.word(kind))
                .put("tool", tool)
                .put("setupSha256", setupSha256);
        top.set("settings", settings);
        top.set("figures", figures);
        ArrayNode list = top.putArray("losses");
        losses.forEach(list::add);
        return bytes(top);
    }

    /** JSON as the files of a take have it: indented, UTF-8. */
    static byte[] bytes(ObjectNode top) {
        try {
            return (MAPPER.writeValueAsString(top) + "\n").getBytes(StandardCharsets.UTF_8);
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException(impossible);
        }
    }

    /** Reads take.json. @throws ShotException if it is not as it must be */
    static TakeRecord read(JsonPlace top) {
        top.version(SetupReader.FORMAT).only("wispwright", "take", "kind", "tool", "setupSha256", "settings", "figures", "losses");
        Kind kind = top.need("kind").choice(Kind.class);
        String tool = top.need("tool").text(100);
        String digest = top.need("setupSha256").text(64);
        List<Double> losses = top.need("losses").items(0, 1_000_000).stream().map(p -> p.number(-1e300, 1e300)).toList();
        return top.make(() -> new TakeRecord(kind, tool, digest, top.need("settings").object(), top.need("figures").object(), losses));
    }
}
