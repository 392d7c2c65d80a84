package org.wispwright.optimize.solve;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.optimize.flow.Pace;
import org.wispwright.optimize.flow.Side;
import org.wispwright.optimize.flow.Sides;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.flow.Start;
import org.wispwright.optimize.flow.Wind;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** Substeps from a largest displacement, where the air's speed is known. */
class PacingTest {
    private static final GridShape BOX = new GridShape(8, 6, 4, 0.25, 0, 0, 0);
    private static final FrameRange FRAMES = new FrameRange(11, 15, 10);

    private static FlowSetup open(Pace pace) {
        Sides open = new Sides(Side.OPEN, Side.OPEN, Side.OPEN, Side.OPEN, Side.OPEN, Side.OPEN);
        return new FlowSetup(BOX, FRAMES, 1, Interpolation.LINEAR, Interpolation.LINEAR, open, 0, 0, List.of()).withPace(pace);
    }

    private static FlowSetup blowing(Pace pace, float metresPerSecond) {
        MacVelocity u = new MacVelocity(BOX);
        Arrays.fill(u.y(), metresPerSecond);
        return open(pace).withStart(new Start(Optional.empty(), Optional.empty(), Optional.of(u)));
    }

    private static int found(FlowSetup flow) {
        try (Lanes lanes = new Lanes(1)) {
            return Pacing.run(flow, lanes, () -> false).substeps();
        }
    }

    /** By hand: even air between open sides keeps its speed v, so it moves v dt / h cells a frame: 12 m/s x 0.1 s / 0.25 m = 4.8. */
    @ParameterizedTest
    @CsvSource({"12, 5, 1", "12, 4.7, 2", "12, 2.41, 2", "12, 2.39, 3", "-12, 1, 5", "12, 0.101, 48", "0, 0.01, 1"})
    void evenAirMovesItsSpeed(float metresPerSecond, double mostCells, int substeps) {
        assertEquals(substeps, found(blowing(Pace.within(mostCells), metresPerSecond)));
    }

    /**
     * By hand: an even push a from rest gives v = a t however it is cut into substeps, fastest at the end, t = 0.4 s: 20 m/s2 x 0.4 s x
     * 0.1 s / 0.25 m = 3.2 cells a frame.
     */
    @ParameterizedTest
    @CsvSource({"3.25, 1", "3.15, 2", "1.65, 2", "1.55, 3", "0.5, 7"})
    void aPushMovesAirFastestAtItsEnd(double mostCells, int substeps) {
        Wind push = new Wind(Curve.still(new Vec3(0, 0, 20)), Curve.still(new Vec3(0, 0, 0)), 0);
        assertEquals(substeps, found(open(Pace.within(mostCells)).withWind(push)));
    }

    @Test void aKnownNumberStays() {
        FlowSetup stated = blowing(Pace.of(3), 12);
        assertEquals(3, found(stated));
        FlowSetup known = blowing(Pace.within(1).found(7), 12);
        try (Lanes lanes = new Lanes(1)) {
            assertSame(known, Pacing.run(known, lanes, () -> false));
        }
    }

    /** By hand: 4.8 cells a frame in steps of 0.07 are 69 substeps, in steps of 4.8 / 64 they are 64. */
    @Test void moreThanTheMostIsRefused() {
        IllegalArgumentException refused = assertThrows(IllegalArgumentException.class, () -> found(blowing(Pace.within(0.07), 12)));
        assertTrue(refused.getMessage().contains("4.800 cells a frame") && refused.getMessage().contains("at most 64 substeps"),
                refused.getMessage());
        assertEquals(64, found(blowing(Pace.within(4.8 / 64 + 1e-6), 12)));
    }

    /** A next run always has more substeps, also where rounding says as many. */
    @Test void theNextRunHasMore() {
        FlowSetup flow = blowing(Pace.within(2.4).found(2), 12);
        Pacing pacing = new Pacing(flow);
        pacing.add(flow.startState());
        assertEquals(2.4, pacing.cells(), 1e-6);
        SmokeState quicker = flow.startState();
        quicker.velocity().y()[0] = -12.00001f;
        pacing.add(quicker);
        assertFalse(pacing.holds());
        assertEquals(3, pacing.next().substeps());
    }

    @Test void airThatIsNoNumberIsRefused() {
        FlowSetup flow = blowing(Pace.within(1), 12);
        Pacing pacing = new Pacing(flow);
        SmokeState state = flow.startState();
        state.velocity().x()[5] = Float.NaN;
        pacing.add(state);
        assertFalse(pacing.holds());
        assertThrows(IllegalArgumentException.class, pacing::next);
    }

    @Test void pacesThatAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> new Pace(0, 0));
        assertThrows(IllegalArgumentException.class, () -> Pace.of(65));
        assertThrows(IllegalArgumentException.class, () -> Pace.within(-1));
        assertThrows(IllegalArgumentException.class, () -> Pace.within(Double.NaN));
        assertTrue(Pace.within(1).isOpen());
        assertFalse(Pace.of(1).isOpen());
    }
}
