package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.PrintWriter;
import java.io.StringWriter;
import org.junit.jupiter.api.Test;

class ProgressLineTest {
    private final StringWriter said = new StringWriter();

    @Test
    void onATerminalOneLineIsWrittenOverAndWipedAtTheEnd() {
        try (ProgressLine line = ProgressLine.to(new PrintWriter(said), true)) {
            line.now("frame 1 of 9");
            line.milestone("band 1 done");
        }
        String text = said.toString();
        assertTrue(text.startsWith("\rframe 1 of 9"), text);
        assertTrue(text.endsWith("\r" + " ".repeat(12) + "\rband 1 done" + System.lineSeparator()), text);
    }

    @Test
    void inAPipeThereAreWholeLinesAndNoCarriageReturns() {
        try (ProgressLine line = ProgressLine.to(new PrintWriter(said), false)) {
            line.milestone("band 1 done");
            line.now("frame 1 of 9");
            line.now("frame 2 of 9");
        }
        assertEquals("band 1 done" + System.lineSeparator(), said.toString());
        assertFalse(said.toString().replace(System.lineSeparator(), "").contains("\r"));
    }
}
