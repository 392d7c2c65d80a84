package org.wispwright.ui.shot;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class NearestWordTest {
    /** Levenshtein distances by hand; kitten to sitting is the textbook's 3. */
    @ParameterizedTest
    @CsvSource({"kitten, sitting, 3", "flow, flow, 0", "flow, low, 1", "abc, '', 3"})
    void changesByHand(String a, String b, int changes) {
        assertEquals(changes, NearestWord.changes(a, b));
    }

    @Test
    void namesTheOneThatWasMeant() {
        List<String> known = List.of("buoyancy", "dissipation", "substeps", "cellMetres");
        assertEquals(Optional.of("buoyancy"), NearestWord.to("bouyancy", known));
        assertEquals(Optional.of("substeps"), NearestWord.to("substep", known));
        assertEquals(Optional.of("cellMetres"), NearestWord.to("cellmeters", known));
        assertEquals(Optional.empty(), NearestWord.to("colour", known));
    }
}
