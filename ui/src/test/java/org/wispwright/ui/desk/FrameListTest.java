package org.wispwright.ui.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.ui.shot.ShotException;

/** Frames as people write them. Expectations: by hand. */
class FrameListTest {
    private static final FrameRange RANGE = new FrameRange(1001, 1048, 24);

    @Test
    void numbersAndSpansInAnyOrderEachOnce() {
        assertEquals(List.of(1005, 1030, 1034, 1037, 1040), FrameList.parse(" 1034-1040 1030,1005, 1037", 3, RANGE));
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "x", "1030-", "1030-1040-1041", "1040-1030", "1001", "1001-1010", "1049", "9999999999", "-3"})
    void whatIsNoFrameIsRefusedInASentence(String text) {
        ShotException refused = assertThrows(ShotException.class, () -> FrameList.parse(text, 1, RANGE));
        assertTrue(refused.finding().inWords().startsWith("frames: found "), refused.finding().inWords());
    }
}
