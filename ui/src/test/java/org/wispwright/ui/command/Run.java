package org.wispwright.ui.command;

import java.io.PrintWriter;
import java.io.StringWriter;
import org.wispwright.ui.job.Cancel;

/** One run of the program inside the test: exit code and what it said. */
record Run(int code, String out, String err) {

    static Run of(String... args) {
        return of(new Cancel(), args);
    }

    static Run of(Cancel cancel, String... args) {
        StringWriter out = new StringWriter();
        StringWriter err = new StringWriter();
        int code = Main.run(args, new PrintWriter(out), new PrintWriter(err), cancel);
        return new Run(code, out.toString(), err.toString());
    }
}
