package org.wispwright.render.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Outside checks R29 to R39: IEC 61966-2-1:1999, Rec. ITU-R BT.709, CIE 15. */
class ColourTest {

    /** R29: IEC 61966-2-1, light of 8-bit codes; 10 is the last code of the straight piece. */
    @ParameterizedTest
    @CsvSource({"0, 0", "1, 0.000303526983548837", "2, 0.000607053967097675", "5, 0.00151763491774419", "8, 0.0024282158683907",
        "10, 0.00303526983548837", "11, 0.00334653576389916", "12, 0.00367650732404743", "16, 0.00518151670233839",
        "32, 0.0144438435960925", "50, 0.0318960330730115", "64, 0.0512694583740432", "89, 0.0998987282471139",
        "90, 0.102241733088101", "100, 0.127437680435647", "118, 0.18116424424986", "119, 0.184474994500441",
        "127, 0.212230757414055", "128, 0.215860500113899", "150, 0.304987314069886", "186, 0.491020849847835",
        "187, 0.49693299506087", "188, 0.502886458032568", "200, 0.57758044042965", "220, 0.715693500506481",
        "230, 0.79129794033263", "231, 0.799102738014409", "232, 0.806952257669251", "240, 0.871367119198797",
        "250, 0.955973353249286", "254, 0.99110209711383", "255, 1"})
    void r29_decode(int code, double light) {
        assertEquals(light, Srgb.decode(code / 255.0), 1e-12);
        assertEquals((float) light, Srgb.decodeByte(code), 6e-8 * light);
    }

    /** R30: IEC 61966-2-1, code of a light. */
    @ParameterizedTest
    @CsvSource({"0.001, 0.01292", "0.003, 0.03876", "0.01, 0.09985282273412834", "0.02, 0.1517037193162421", "0.05, 0.2478005279926317",
        "0.09, 0.331830021509582", "0.1, 0.3491902126282939", "0.18, 0.4613561295004416", "0.2, 0.4845292044817069",
        "0.36, 0.6342527406021729", "0.5, 0.7353569830524495", "0.72, 0.8650420277517010", "0.9, 0.9546871718858663"})
    void r30_encode(double light, double code) {
        assertEquals(code, Srgb.encode(light), 1e-13);
    }

    /** R30: 18 % grey is code 117.6458, so 118; half light is 188. */
    @Test
    void r30_greyCard() {
        assertEquals(117.6458, 255 * Srgb.encode(0.18), 5e-5);
        assertEquals(118, Srgb.encodeTo(255, 0.18));
        assertEquals(188, Srgb.encodeTo(255, 0.5));
    }

    /** R31: IEC 61966-2-1, the two pieces are 2.9e-8 apart at the joint. */
    @Test
    void r31_joint() {
        assertEquals(0.040449936, Srgb.encode(0.0031308), 1e-15);
        assertEquals(0.04044990748269015, Srgb.encode(Math.nextUp(0.0031308)), 1e-15);
        assertEquals(0.003130804953560372, Srgb.decode(0.04045), 1e-15);
        assertEquals(0.003130807283067682, Srgb.decode(Math.nextUp(0.04045)), 1e-15);
        assertEquals(2.9e-8, Srgb.encode(0.0031308) - Srgb.encode(Math.nextUp(0.0031308)), 1e-9);
    }

    /** R32: decode, encode, round is the identity on all 256 codes. */
    @Test
    void r32_allCodesSurvive() {
        int kept = 0;
        for (int code = 0; code < 256; code++) {
            kept += Srgb.encodeTo(255, Srgb.decodeByte(code)) == code ? 1 : 0;
        }
        assertEquals(256, kept);
    }

    /** R33, 8 bits: WCAG 2.x, definition of relative luminance: the older threshold 0.03928 gives the same on every code. */
    @Test
    void r33_olderThreshold() {
        int between = 0;
        for (int code = 0; code < 256; code++) {
            double c = code / 255.0;
            double older = c <= 0.03928 ? c / 12.92 : Math.pow((c + 0.055) / 1.055, 2.4);
            between += older == Srgb.decode(c) ? 0 : 1;
        }
        assertEquals(0, between);
        assertNotEquals(0.04 / 12.92, Math.pow((0.04 + 0.055) / 1.055, 2.4), "the two would differ between the thresholds");
    }

    /** R34: BT.709 item 3, luminance of linear values. */
    @Test
    void r34_luminance() {
        assertEquals(0.2126, Luminance.of(1, 0, 0), 1e-12);
        assertEquals(0.7152, Luminance.of(0, 1, 0), 1e-12);
        assertEquals(0.0722, Luminance.of(0, 0, 1), 1e-12);
        assertEquals(0.9278, Luminance.of(1, 1, 0), 1e-12);
        assertEquals(0.21623992427079, Luminance.of(Srgb.decode(200 / 255.0), Srgb.decode(100 / 255.0), Srgb.decode(50 / 255.0)), 1e-12);
    }

    /** R35: BT.709, luma has the same weights on coded values and is another number. */
    @Test
    void r35_lumaIsNotLuminance() {
        assertEquals(117.65, Luminance.of(200, 100, 50), 1e-9);
        double luminance = Luminance.of(Srgb.decode(200 / 255.0), Srgb.decode(100 / 255.0), Srgb.decode(50 / 255.0));
        assertEquals(128, Srgb.encodeTo(255, luminance));
    }

    /** R36: BT.709, the weights sum to one. */
    @Test
    void r36_weights() {
        assertEquals(1, Luminance.RED + Luminance.GREEN + Luminance.BLUE, 2e-16);
    }

    /** R37: BT.709's camera curve. Nothing here uses it: kept as a guard that sRGB's curve is not it.
     * The row gives 0.018 to eight digits, so that one is checked to half of the last: 5e-9, the others to 1e-9. */
    @ParameterizedTest
    @CsvSource({"0.01, 0.045", "0.018, 0.08124794", "0.18, 0.4090077288641504", "0.5, 0.7055150899221212", "1, 1"})
    void r37_cameraCurve(double light, double code) {
        double curve = light < 0.018 ? 4.5 * light : 1.099 * Math.pow(light, 0.45) - 0.099;
        assertEquals(code, curve, light == 0.018 ? 5e-9 : 1e-9);
        assertTrue(light == 1 || Srgb.encode(light) - code > 0.02, "sRGB's curve lies above the camera's");
    }

    /** R38: CIE 15, L*. */
    @ParameterizedTest
    @CsvSource({"0.18, 49.496107610119594", "0.5, 76.06926101415557", "0.001, 0.903296296296296"})
    void r38_lightness(double luminance, double expected) {
        assertEquals(expected, Luminance.lightness(luminance), 1e-10);
    }

    /** R39: trade practice and IEC 61966-2-1: stops from 18 % grey and their codes. */
    @ParameterizedTest
    @CsvSource({"-4, .01125, 0.10764198919996239", "-3, .0225, 0.1621010091456021", "-2, .045, 0.2347950793880828",
        "-1, .09, 0.331830021509582", "1, .36, 0.6342527406021729", "2, .72, 0.8650420277517010"})
    void r39_stops(double stops, double light, double code) {
        assertEquals(light, 0.18 * Exposure.factor(stops), 1e-12);
        assertEquals(code, Srgb.encode(0.18 * Exposure.factor(stops)), 1e-12);
    }

    /** R39: three stops up clip; 2.473931188332412 stops reach white. */
    @Test
    void r39_upToWhite() {
        assertEquals(1.44, 0.18 * Exposure.factor(3), 1e-12);
        assertEquals(255, Srgb.encodeTo(255, 0.18 * Exposure.factor(3)));
        assertEquals(2.473931188332412, Exposure.stops(0.18, 1), 1e-12);
    }

    @Test
    void exposureLeavesAlphaAlone() {
        Picture picture = new Picture(1, 1, new float[] {0.1f, 0.2f, 0.3f, 0.5f});
        Exposure.apply(picture, 1, picture);
        assertEquals(0.2f, picture.at(0, 0, 0));
        assertEquals(0.6f, picture.at(0, 0, 2));
        assertEquals(0.5f, picture.at(0, 0, 3));
    }
}
