package org.wispwright.ui.window;

import java.awt.AWTEvent;
import java.awt.EventQueue;
import java.awt.Toolkit;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/**
 * Watches the event thread: how much work each event makes it do, by the thread's own processor time, so that other programs on the machine
 * do not count. What is thrown on it is kept too.
 */
public final class EventWatch implements AutoCloseable {
    private static final ThreadMXBean THREADS = ManagementFactory.getThreadMXBean();
    private final List<String> slow = Collections.synchronizedList(new ArrayList<>());
    private final List<Throwable> thrown = Collections.synchronizedList(new ArrayList<>());
    private final Queue queue = new Queue();
    private final long mostMillis;
    private volatile boolean counts;
    private int events;
    private double worst;

    /** @param mostMillis an event that takes more is told */
    public EventWatch(long mostMillis) {
        this.mostMillis = mostMillis;
        Toolkit.getDefaultToolkit().getSystemEventQueue().push(queue);
    }

    /** Counts from now on; before, the classes that an event needs may still have to be loaded and compiled. */
    public void start() {
        counts = true;
    }

    /** Events that took too long, each with its time. */
    public List<String> slow() {
        return List.copyOf(slow);
    }

    /** What was thrown while events were seen to. */
    public List<Throwable> thrown() {
        return List.copyOf(thrown);
    }

    /** "812 events, the longest 31 ms". */
    public String inWords() {
        return String.format("%d events, the longest %.0f ms of the event thread's processor time", events, worst);
    }

    @Override
    public void close() {
        queue.end();
    }

    private final class Queue extends EventQueue {
        void end() {
            pop();
        }

        @Override
        protected void dispatchEvent(AWTEvent event) {
            long start = THREADS.getCurrentThreadCpuTime();
            try {
                super.dispatchEvent(event);
            } catch (RuntimeException | Error fault) {
                thrown.add(fault);
                throw fault;
            } finally {
                double millis = (THREADS.getCurrentThreadCpuTime() - start) / 1e6;
                if (counts) {
                    events++;
                    worst = Math.max(worst, millis);
                    if (millis > mostMillis) {
                        slow.add(String.format("%.0f ms: %s", millis, event));
                    }
                }
            }
        }
    }
}
