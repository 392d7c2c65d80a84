package org.wispwright.ui.shot;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class JsonDoorTest {

    @Test
    void aByteOrderMarkIsLetThrough() {
        assertEquals("x", parse("\uFEFF{\"name\": \"x\"}").need("name").text(10));
    }

    /** RFC 6901, section 3: '~' is written ~0 and '/' is written ~1. */
    @Test
    void thePointerEscapesItsTwoSigns() {
        assertEquals("/a~1b~0c", parse("{\"a/b~c\": 1}").at("a/b~c").pointer());
    }

    @Test
    void anExponentIsANumber() {
        assertArrayEquals(new double[] {1e-3, -2.5e2, 0}, parse("[1e-3, -2.5E+2, 0.0]").numbers(3, -1000, 1000));
    }

    @ParameterizedTest
    @ValueSource(strings = {"{'a': 1}", "{a: 1}", "{\"a\": 1,}", "[1 2]", "{\"a\": 01}", "// c\n{}", "{\"a\": .5}", "{\"a\": +1}", "nul",
            "{\"a\": \"\t\"}", "}"})
    void whatIsNotJsonIsRefusedWithItsLine(String text) {
        ShotException refused = assertThrows(ShotException.class, () -> parse(text));
        assertTrue(refused.getMessage().startsWith("file.json"), refused.getMessage());
        assertTrue(refused.getMessage().contains("line "), refused.getMessage());
        assertEquals(1, refused.getMessage().lines().count(), refused.getMessage());
    }

    @ParameterizedTest
    @ValueSource(strings = {"1.5", "1e10", "-1", "\"1\"", "true", "[1]", "1e400", "-Infinity", "NaN", "99999999999999999999"})
    void whatIsNotAWholeNumberInRangeIsRefused(String value) {
        assertThrows(ShotException.class, () -> parse("{\"n\": " + value + "}").need("n").whole(0, 100));
    }

    @Test
    void aWholeNumberMayBeWrittenWithAPoint() {
        assertEquals(24, parse("{\"n\": 24.0}").need("n").whole(0, 100));
    }

    private static JsonPlace parse(String text) {
        return JsonDoor.parse("file.json", text.getBytes(StandardCharsets.UTF_8));
    }
}
