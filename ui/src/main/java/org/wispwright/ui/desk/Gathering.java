package org.wispwright.ui.desk;

import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ExecutorService;
import java.util.function.BiFunction;
import org.wispwright.ui.job.Cancel;

/**
 * Values of many keys, worked out one after the other beside the desk, and kept. Who asks anew drops what was asked before and has not
 * come.
 * A key that cannot be worked out has no value until it is asked with other keys. Desk's thread.
 */
final class Gathering<K, V> {
    private final Workers workers;
    private final ExecutorService lane;
    private final Map<K, V> there;
    private final Map<String, Asker> askers = new LinkedHashMap<>();

    /** @param most values that are kept; those not asked for longest go first */
    Gathering(Workers workers, ExecutorService lane, int most) {
        this.workers = workers;
        this.lane = lane;
        there = new LinkedHashMap<>(16, 0.75f, true) {
            @Override
            protected boolean removeEldestEntry(Map.Entry<K, V> eldest) {
                return size() > most;
            }
        };
    }

    /** The value, if it has come. */
    Optional<V> get(K key) {
        return Optional.ofNullable(there.get(key));
    }

    /**
     * Asks for values, in this order; nothing new if the same keys are asked for already.
     *
     * @param who  who asks
     * @param work on the lane: a key's value
     * @param came on the desk's thread, after each value
     */
    void want(String who, List<K> keys, BiFunction<K, Cancel, V> work, Runnable came) {
        Asker asker = askers.computeIfAbsent(who, w -> new Asker());
        if (asker.keys.equals(keys)) {
            return;
        }
        asker.keys = List.copyOf(keys);
        asker.work = work;
        asker.came = came;
        asker.tried.clear();
        if (asker.running == null) {
            asker.next();
        } else if (!keys.contains(asker.running)) {
            asker.cancel.wish();                                               // it ends soon, and goes on with the new keys
        }
    }

    private final class Asker {
        private final Set<K> tried = new HashSet<>();
        private List<K> keys = List.of();
        private BiFunction<K, Cancel, V> work;
        private Runnable came;
        private K running;
        private Cancel cancel;

        private void next() {
            running = keys.stream().filter(key -> !there.containsKey(key) && !tried.contains(key)).findFirst().orElse(null);
            if (running == null || lane.isShutdown()) {
                return;                                                        // the desk is being put away
            }
            K key = running;
            BiFunction<K, Cancel, V> how = work;
            Cancel mine = new Cancel();
            cancel = mine;
            lane.execute(() -> {
                Optional<V> value = attempt(how, key, mine);
                workers.onDesk(() -> came(key, value));
            });
        }

        private Optional<V> attempt(BiFunction<K, Cancel, V> how, K key, Cancel mine) {
            try {
                mine.stopIfWished();
                return Optional.of(how.apply(key, mine));
            } catch (RuntimeException none) {
                return Optional.empty();                                       // its place stays empty; who opens it is told why
            }
        }

        private void came(K key, Optional<V> value) {
            tried.add(key);
            value.ifPresent(v -> there.put(key, v));
            running = null;
            if (value.isPresent() && keys.contains(key)) {
                came.run();
            }
            next();
        }
    }
}
