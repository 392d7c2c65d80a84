package org.wispwright.ui.shot;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Expected texts were written by hand; only the named value may differ. */
class NoteTextTest {
    @Test
    void aValueIsSwappedInItsPlace() {
        assertEquals("{ \"a\":{\"on\":1},\t\"on\" :false ,\"b\":[ ]}\r\n",
                NoteText.with("{ \"a\":{\"on\":1},\t\"on\" :true ,\"b\":[ ]}\r\n",
                "on", "false"));
        assertEquals("{\"frame\":1005}", NoteText.with("{\"frame\":1.004e3}", "frame", "1005"));
    }

    @Test
    void aTextWithQuotesAndCommasIsSwappedWhole() {
        assertEquals("{\"view\": \"side\", \"x\": 1}", NoteText.with("{\"view\": \"a\\\\\\\"},\u00e9\", \"x\": 1}", "view", "\"side\""));
    }

    @Test
    void aMissingKeyGoesFirstWithTheSameSpace() {
        assertEquals("\uFEFF{\r\n  \"on\": false,\r\n  \"a\": 1\r\n}", NoteText.with("\uFEFF{\r\n  \"a\": 1\r\n}", "on", "false"));
        assertEquals("{\"on\": false, \"a\": 1}", NoteText.with("{\"a\": 1}", "on", "false"));
    }

    /** Longer than the parser's buffer of 4000 characters, so that its count of characters goes on from one to the next. */
    @Test
    void farDownALongText() {
        String before = "{\"words\": \"" + "\u00e9 ".repeat(50_000) + "\", \"on\": ";
        assertEquals(before + "false}", NoteText.with(before + "true}", "on", "false"));
    }

    @ParameterizedTest
    @ValueSource(strings = {"[]", "{}", "{\"on\"", ""})
    void whatIsNoNoteIsRefused(String text) {
        assertThrows(IllegalArgumentException.class, () -> NoteText.with(text, "on", "false"));
    }
}
