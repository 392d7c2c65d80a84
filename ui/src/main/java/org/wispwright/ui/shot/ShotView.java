package org.wispwright.ui.shot;

import java.util.Collections;
import java.util.SortedMap;
import java.util.TreeMap;
import org.wispwright.render.view.View;

/**
 * A view of a shot and the frames that the production renderer made through it.
 *
 * @param view the camera
 * @param rendered frame number to PNG or EXR file inside the shot folder; may be empty
 */
public record ShotView(View view, SortedMap<Integer, String> rendered) {
    /** Keeps an unchangeable copy. */
    public ShotView {
        rendered = Collections.unmodifiableSortedMap(new TreeMap<>(rendered));
    }
}
