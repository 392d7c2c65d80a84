package org.wispwright.ui.shot;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Sides;
import org.wispwright.optimize.flow.Source;
import org.wispwright.optimize.flow.Start;
import org.wispwright.optimize.flow.Wind;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.Solid;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;

/**
 * SHA-256 over a set-up's values, one line a part, in a fixed order; the same set-up has the same digest on every machine. Names do not
 * count, the values of volumes do. A part that a later format adds must add no line while it has its default.
 */
final class SetupDigest {
    private final StringBuilder lines = new StringBuilder();

    private SetupDigest() {
    }

    static String of(FlowSetup flow) {
        SetupDigest digest = new SetupDigest();
        digest.plain(flow);
        flow.obstacles().forEach(digest::obstacle);
        if (flow.heat().isCarried()) {
            digest.line("heat", flow.heat().lift(), flow.heat().cooling());
        }
        digest.wind(flow.wind());
        digest.start(flow.start());
        return sha256(digest.lines.toString().getBytes(StandardCharsets.UTF_8));
    }

    private void plain(FlowSetup flow) {
        GridShape g = flow.grid();
        FrameRange f = flow.frames();
        Sides s = flow.sides();
        line("grid", g.nx(), g.ny(), g.nz(), g.cellMetres(), g.originX(), g.originY(), g.originZ());
        line("frames", f.first(), f.last(), f.perSecond());
        line("flow", flow.pace().mostCells() > 0 ? "within " + flow.pace().mostCells() : flow.substeps(), flow.velocity(), flow.density(), flow.buoyancy(), flow.dissipation());
        line("sides", s.left(), s.right(), s.floor(), s.top(), s.back(), s.front());
        flow.sources().forEach(this::source);
    }

    private void source(Source source) {
        Vec3 at = source.centre().values().get(0);
        Vec3 half = source.form().half();
        line("source", at.x(), at.y(), at.z(), half.x(), source.edgeMetres(), source.ratePerSecond(), source.firstFrame(),
                source.lastFrame());
        if (!source.form().round()) {
            line("source box", half.y(), half.z());
        }
        if (source.kelvinPerSecond() != 0) {
            line("source warmth", source.kelvinPerSecond());
        }
        if (!source.centre().isStill()) {
            curve("source at", source.centre());
        }
    }

    private void wind(Wind wind) {
        if (!wind.isNone()) {
            line("wind", wind.dragPerSecond());
            curve("wind velocity", wind.velocity());
            curve("wind push", wind.acceleration());
        }
    }

    private void start(Start start) {
        start.density().ifPresent(density -> line("start density", values(density.values())));
        start.temperature().ifPresent(temperature -> line("start temperature", values(temperature.values())));
        start.velocity().ifPresent(u -> line("start velocity", values(u.x()), values(u.y()), values(u.z())));
    }

    private void obstacle(Obstacle obstacle) {
        Solid solid = obstacle.solid();
        if (solid instanceof Solid.Box box) {
            line("obstacle box", box.half().x(), box.half().y(), box.half().z());
        } else if (solid instanceof Solid.Ball ball) {
            line("obstacle ball", ball.radius());
        } else if (solid instanceof Solid.Cylinder cylinder) {
            line("obstacle cylinder", cylinder.radius(), cylinder.halfLength());
        } else if (solid instanceof Solid.Volume volume) {
            line("obstacle volume", volume.kind(), volume.shape().nx(), volume.shape().ny(), volume.shape().nz(),
                    volume.shape().cellMetres(),
                    values(volume.values()));
        }
        curve("position", obstacle.position());
        curve("rotation", obstacle.rotation());
    }

    private void curve(String what, Curve curve) {
        for (int n = 0; n < curve.frames().size(); n++) {
            Vec3 v = curve.values().get(n);
            line(what, curve.frames().get(n), v.x(), v.y(), v.z());
        }
    }

    private void line(String part, Object... values) {
        lines.append(part);
        for (Object value : values) {
            lines.append(' ').append(value);
        }
        lines.append('\n');
    }

    private static String values(float[] values) {
        ByteBuffer bytes = ByteBuffer.allocate(4 * values.length).order(ByteOrder.LITTLE_ENDIAN);
        bytes.asFloatBuffer().put(values);
        return sha256(bytes.array());
    }

    private static String sha256(byte[] bytes) {
        try {
            return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException(impossible);
        }
    }
}
