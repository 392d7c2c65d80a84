package org.wispwright.warp.mesh;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Deque;
import java.util.List;
import java.util.TreeSet;

/** Which corners of a mesh an edge joins. */
final class Rings {
    private Rings() {
    }

    /** For each corner the corners joined to it, in rising order. */
    static int[][] of(TriangleMesh mesh) {
        List<TreeSet<Integer>> sets = new ArrayList<>();
        for (int i = 0; i < mesh.corners(); i++) {
            sets.add(new TreeSet<>());
        }
        int[] t = mesh.triangles();
        for (int n = 0; n < t.length; n += 3) {
            for (int k = 0; k < 3; k++) {
                int a = t[n + k];
                int b = t[n + (k + 1) % 3];
                sets.get(a).add(b);
                sets.get(b).add(a);
            }
        }
        int[][] rings = new int[sets.size()][];
        for (int i = 0; i < rings.length; i++) {
            rings[i] = sets.get(i).stream().mapToInt(Integer::intValue).toArray();
        }
        return rings;
    }

    /** Throws unless a way along edges leads from every corner to a handle. */
    static void requireReached(int[][] rings, int[] handles) {
        boolean[] reached = new boolean[rings.length];
        Deque<Integer> open = new ArrayDeque<>();
        for (int handle : handles) {
            reached[handle] = true;
            open.add(handle);
        }
        while (!open.isEmpty()) {
            for (int j : rings[open.remove()]) {
                if (!reached[j]) {
                    reached[j] = true;
                    open.add(j);
                }
            }
        }
        for (int i = 0; i < reached.length; i++) {
            if (!reached[i]) {
                throw new IllegalArgumentException("as rigid as possible: no handle of " + Arrays.toString(handles)
                        + " holds the part of the mesh around corner " + i + "; add one there");
            }
        }
    }
}
