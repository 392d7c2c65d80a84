package org.wispwright.ui.command;

import picocli.CommandLine.Option;

/** With how much a command runs. Mixed into the commands that run something. */
final class Means {
    @Option(names = "--threads", paramLabel = "N", converter = ThreadCount.Converter.class,
            description = "Threads to use; the result has the same bits for any number. Default: one for each core.")
    private ThreadCount threads;

    @Option(names = "--memory", paramLabel = "SIZE", converter = ByteSize.Converter.class,
            description = "The memory that the work may take, such as 512M or 2G, and never more than Java has (java -Xmx2g). Default: what Java has.")
    private ByteSize memory;

    /** Bytes that the work may take. */
    long memoryBytes() {
        long most = Runtime.getRuntime().maxMemory();
        return memory == null ? most : Math.min(most, memory.bytes());
    }

    /** Lanes to run on. */
    int threads() {
        return threads == null ? Runtime.getRuntime().availableProcessors() : threads.count();
    }
}
