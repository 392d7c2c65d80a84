package org.wispwright.render.view;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.volume.GridShape;

/** Outside checks R48 to R54 (pinhole geometry, Hartley and Zisserman 2004, ch. 6), and what a view refuses. */
class ViewTest {
    private static final Vec3 UP = new Vec3(0, 1, 0);
    private static final View FILM = new View("film", new Pinhole(50, 36, 24), new Vec3(0, 0, 0), new Vec3(0, 0, -1), UP, new Raster(1920, 1280));
    private static final GridShape BOX = new GridShape(4, 6, 5, 0.5, 1, 2, 3);

    /** R48: angle = 2 atan(gate / 2f), 36 x 24 (ISO 1007). The 50 mm row is in published tables as 39.6, 27.0, 46.8. */
    @ParameterizedTest
    @CsvSource({"36, 24, 14, 104.250033, 81.202589, 114.182131", "36, 24, 18, 90.000000, 67.380135, 100.475682",
        "36, 24, 20, 83.974425, 61.927513, 94.493214", "36, 24, 24, 73.739795, 53.130102, 84.062228",
        "36, 24, 28, 65.470453, 46.397181, 75.380650", "36, 24, 35, 54.432223, 37.849289, 63.439967",
        "36, 24, 50, 39.597753, 26.991467, 46.793003", "36, 24, 85, 23.913168, 16.071421, 28.558322",
        "36, 24, 100, 20.407947, 13.685547, 24.413730", "36, 24, 135, 15.189287, 10.159216, 18.208119",
        "36, 24, 200, 10.285529, 6.867261, 12.346968"})
    void r48_anglesOfFullFrame(double width, double height, double focal, double h, double v, double d) {
        angles(width, height, focal, h, v, d);
    }

    /** R49: the same, 24.89 x 18.66. */
    @ParameterizedTest
    @CsvSource({"24.89, 18.66, 14, 83.269619, 67.361244, 96.019878", "24.89, 18.66, 18, 69.319102, 54.798425, 81.661322",
        "24.89, 18.66, 25, 52.928244, 40.931149, 63.776444", "24.89, 18.66, 32, 42.502739, 32.509408, 51.845298",
        "24.89, 18.66, 35, 39.147866, 29.852645, 47.920726", "24.89, 18.66, 40, 34.564448, 26.258988, 42.497141",
        "24.89, 18.66, 50, 27.953820, 21.139665, 34.559747", "24.89, 18.66, 75, 18.842872, 14.182331, 23.432591",
        "24.89, 18.66, 85, 16.659188, 12.527956, 20.739454", "24.89, 18.66, 100, 14.187973, 10.660531, 17.681889",
        "24.89, 18.66, 135, 10.533872, 7.906977, 13.144687"})
    void r49_anglesOfTheFullSilentAperture(double width, double height, double focal, double h, double v, double d) {
        angles(width, height, focal, h, v, d);
    }

    /** R50: a 16:9 crop of a 36 mm wide gate keeps the horizontal angle. */
    @Test
    void r50_anglesOfACrop() {
        Pinhole lens = new Pinhole(50, 36, 20.25);
        assertEquals(39.597753, lens.horizontalDegrees(), 5e-7);
        assertEquals(22.895193, lens.verticalDegrees(), 5e-7);
    }

    /** R51: rays through pixel centres. */
    @ParameterizedTest
    @CsvSource({"0, 0, -0.330259598017598, 0.220115698730854, -0.917865827389539",
        "960, 640, 0.000187499993408, -0.000187499993408, -0.999999964843752",
        "1919, 0, 0.330259598017598, 0.220115698730854, -0.917865827389539"})
    void r51_raysThroughPixelCentres(int x, int y, double dx, double dy, double dz) {
        near(new Vec3(dx, dy, dz), FILM.ray(x, y).direction(), 1e-14);
    }

    /** R52: with even counts no centre lies on the axis, and the frame's corner is not a pixel's centre. */
    @Test
    void r52_evenCountsHaveNoCentralPixel() {
        Vec3 before = FILM.ray(959, 639).direction();
        Vec3 after = FILM.ray(960, 640).direction();
        near(new Vec3(-after.x(), -after.y(), after.z()), before, 1e-16);
        assertTrue(after.x() != 0 && after.y() != 0);
        near(new Vec3(-0.33040039, 0.22026693, -0.91777887), FILM.rayThrough(0, 0).direction(), 1e-8);
    }

    /** R53: projection back. */
    @ParameterizedTest
    @CsvSource({"0, 0, -10, 960, 640", "1, .5, -10, 1226.6666666666667, 506.66666666666667", "-3.6, 2.4, -10, 0, 0",
        "2, -1, -20, 1226.6666666666667, 773.3333333333333"})
    void r53_projection(double x, double y, double z, double px, double py) {
        View.ImagePoint got = FILM.project(new Vec3(x, y, z)).orElseThrow();
        assertEquals(px, got.x(), 1e-10);
        assertEquals(py, got.y(), 1e-10);
        assertEquals(-z, got.depthMetres(), 1e-12);
    }

    /** R54: angle between the neighbouring centre rays (959,640) and (960,640), both half a pixel below the axis. */
    @Test
    void r54_angleBetweenNeighbours() {
        Vec3 cross = FILM.ray(959, 640).direction().cross(FILM.ray(960, 640).direction());
        assertEquals(0.021485916686769, Math.toDegrees(Math.asin(cross.length())), 1e-9);
    }

    @Test
    void projectionUndoesTheRayForBothLenses() {
        Vec3 from = new Vec3(7, 5, -4);
        Vec3 to = new Vec3(2, 3, 4);
        for (Lens lens : new Lens[] {new Pinhole(35, 30, 20), new Orthographic(6, 4)}) {
            View view = new View("any", lens, from, to, new Vec3(0.2, 1, 0.1), new Raster(30, 20));
            View.ImagePoint got = view.project(view.ray(7, 16).at(3.7)).orElseThrow();
            assertEquals(7.5, got.x(), 1e-10);
            assertEquals(16.5, got.y(), 1e-10);
            assertTrue(view.project(from.minus(to.minus(from))).isEmpty(), "a point behind the eye is not seen");
        }
    }

    @Test
    void proxiesKeepTheAspect() {
        assertEquals(new Raster(192, 128), FILM.withRasterHeight(128).raster());
        assertEquals(new Raster(192, 128), FILM.withRasterHeight(127).raster(), "127 rows would need 190.5 pixels");
        View wide = new View("wide", new Pinhole(50, 36, 20.25), new Vec3(0, 0, 0), new Vec3(0, 0, -1), UP, new Raster(1280, 720));
        assertEquals(new Raster(96, 54), wide.withRasterHeight(58).raster());
        View odd = new View("odd", new Pinhole(50, 36, 20.25), new Vec3(0, 0, 0), new Vec3(0, 0, -1), UP, new Raster(853, 480));
        assertEquals(new Raster(107, 60), odd.withRasterHeight(60).raster(), "853 and 480 have no common part");
        assertEquals(new Raster(1, 1), FILM.withRasterHeight(1).withRasterHeight(1).withRaster(new Raster(1, 1)).raster());
    }

    @Test
    void aViewKnowsWhetherItSeesABox() {
        Vec3 middle = new Vec3(2, 3.5, 4.25);
        Vec3 eye = middle.plus(new Vec3(9, 2, 5));
        View at = new View("at", new Pinhole(50, 36, 24), eye, middle, UP, new Raster(30, 20));
        assertTrue(at.sees(BOX));
        View away = new View("away", new Pinhole(50, 36, 24), eye, eye.plus(eye.minus(middle)), UP, new Raster(30, 20));
        assertFalse(away.sees(BOX));
        View inside = new View("inside", new Pinhole(50, 36, 24), middle, eye, UP, new Raster(3, 2));
        assertTrue(inside.sees(BOX));
        View beside = new View("beside", new Orthographic(3, 2), eye.plus(new Vec3(0, 20, 0)), middle.plus(new Vec3(0, 20, 0)), UP, new Raster(30, 20));
        assertFalse(beside.sees(BOX));
    }

    /** A ray along an axis enters and leaves where the box says; one from inside enters at once. */
    @Test
    void aRayKnowsWhereItIsInsideABox() {
        Ray.Span span = new Ray(new Vec3(0, 3, 4), new Vec3(1, 0, 0)).inside(BOX).orElseThrow();
        assertEquals(1, span.entry(), 1e-15);
        assertEquals(3, span.exit(), 1e-15);
        span = new Ray(new Vec3(2, 3, 4), new Vec3(-1, 0, 0)).inside(BOX).orElseThrow();
        assertEquals(0, span.entry());
        assertEquals(1, span.length(), 1e-15);
        assertTrue(new Ray(new Vec3(0, 3, 4), new Vec3(-1, 0, 0)).inside(BOX).isEmpty());
        assertTrue(new Ray(new Vec3(0, 2, 4), new Vec3(1, 0, 0)).inside(BOX).isEmpty(), "along a face");
    }

    @Test
    void whatDoesNotFitIsRefusedWithTheWayOut() {
        Pinhole lens = new Pinhole(50, 36, 24);
        Vec3 eye = new Vec3(0, 0, 5);
        Vec3 aim = new Vec3(0, 0, 0);
        refused("move one of them", () -> new View("v", lens, eye, eye, UP, new Raster(30, 20)));
        refused("up across the axis", () -> new View("v", lens, eye, aim, new Vec3(0, 0, 2), new Raster(30, 20)));
        refused("needs 30 pixels a row", () -> new View("v", lens, eye, aim, UP, new Raster(32, 20)));
        refused("has no name", () -> new View(" ", lens, eye, aim, UP, new Raster(30, 20)));
        refused("focal length of NaN", () -> new Pinhole(Double.NaN, 36, 24));
        refused("gate height of -1", () -> new Pinhole(50, 36, -1));
        refused("field of 0.0", () -> new Orthographic(0, 3));
        refused("0x20 pixels", () -> new Raster(0, 20));
        refused("finite numbers", () -> new Vec3(0, Double.POSITIVE_INFINITY, 0));
        new View("v", lens, eye, aim, UP, new Raster(107, 71));
    }

    private static void refused(String part, Runnable making) {
        String message = assertThrows(IllegalArgumentException.class, making::run).getMessage();
        assertTrue(message.contains(part), message);
    }

    private static void angles(double width, double height, double focal, double h, double v, double d) {
        Pinhole lens = new Pinhole(focal, width, height);
        assertEquals(h, lens.horizontalDegrees(), 5.1e-7);
        assertEquals(v, lens.verticalDegrees(), 5.1e-7);
        assertEquals(d, lens.diagonalDegrees(), 5.1e-7);
    }

    private static void near(Vec3 expected, Vec3 got, double within) {
        assertEquals(expected.x(), got.x(), within);
        assertEquals(expected.y(), got.y(), within);
        assertEquals(expected.z(), got.z(), within);
    }
}
