package org.wispwright.ui.job;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.lang.management.MemoryPoolMXBean;
import java.nio.file.Files;
import java.nio.file.Path;

/** The most memory that this process has held. */
public final class PeakMemory {
    private PeakMemory() {
    }

    /** Peak resident bytes where the system tells them (VmHWM of Linux's proc), else the sum of Java's own pools' peaks. */
    public static long bytes() {
        try {
            for (String line : Files.readAllLines(Path.of("/proc/self/status"))) {
                if (line.startsWith("VmHWM:")) {
                    return 1024 * Long.parseLong(line.replaceAll("[^0-9]", ""));
                }
            }
        } catch (IOException | NumberFormatException notToldHere) {
            return pools();
        }
        return pools();
    }

    private static long pools() {
        return ManagementFactory.getMemoryPoolMXBeans().stream().map(MemoryPoolMXBean::getPeakUsage)
                .mapToLong(usage -> usage == null ? 0 : usage.getUsed()).sum();
    }
}
