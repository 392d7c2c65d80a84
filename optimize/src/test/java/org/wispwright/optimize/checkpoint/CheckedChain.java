package org.wispwright.optimize.checkpoint;

import java.util.Arrays;

/**
 * A small chaotic chain with one control a step, which checks every call made to it and counts. State (p, q), step n:
 * {@code p' = cos(p) + q + u_n},  {@code q' = p q / (1 + q^2)}; the loss is the sum of {@code w_n p_n^2 / 2} over states 1 to l.
 */
final class CheckedChain implements ReversibleChain {
    final double[] uBar;
    double loss;
    int advances;
    int tapes;
    int pulls;
    int saves;
    int restores;
    private final double[] u;
    private final int slots;
    private final double[][] kept;
    private final int[] keptStep;
    private double p = .3;
    private double q = -.7;
    private int current;
    private int taped = -1;
    private int pulledTo;
    private boolean tapeIsNewest;
    private double tapeP;
    private double tapeQ;
    private double pBar;
    private double qBar;

    CheckedChain(int steps, int slots) {
        u = controls(steps);
        uBar = new double[steps];
        this.slots = slots;
        kept = new double[slots][];
        keptStep = new int[slots];
        pulledTo = steps;
    }

    static double[] controls(int steps) {
        double[] u = new double[steps];
        for (int n = 0; n < steps; n++) {
            u[n] = .4 * Math.sin(1 + 3.7 * n);
        }
        return u;
    }

    static double weight(int state) {
        return 1 + state % 3;
    }

    double p() {
        return p;
    }

    int current() {
        return current;
    }

    @Override
    public void save(int slot) {
        need(slot >= 0 && slot < slots, "slot " + slot + " of " + slots);
        need(!tapeIsNewest, "save between tape and pull");
        kept[slot] = new double[] {p, q};
        keptStep[slot] = current;
        saves++;
    }

    @Override
    public void restore(int slot) {
        need(slot >= 0 && slot < slots && kept[slot] != null, "restore of slot " + slot);
        need(!tapeIsNewest, "restore between tape and pull");
        p = kept[slot][0];
        q = kept[slot][1];
        current = keptStep[slot];
        restores++;
    }

    @Override
    public void advance(int step) {
        need(step == current, "advance " + step + " at state " + current);
        need(!tapeIsNewest, "advance between tape and pull");
        advances++;
        move(step);
    }

    @Override
    public void tape(int step) {
        need(step == current, "tape " + step + " at state " + current);
        need(step == pulledTo - 1, "tape " + step + " with the adjoint at " + pulledTo);
        tapes++;
        taped = step;
        tapeIsNewest = true;
        tapeP = p;
        tapeQ = q;
        move(step);
    }

    @Override
    public void pull(int step) {
        need(tapeIsNewest && taped == step && current == step + 1 && pulledTo == step + 1, "pull " + step);
        pulls++;
        tapeIsNewest = false;
        pBar += weight(step + 1) * p;
        loss += weight(step + 1) * p * p / 2;
        uBar[step] += pBar;
        double below = 1 + tapeQ * tapeQ;
        double toP = -Math.sin(tapeP) * pBar + tapeQ / below * qBar;
        double toQ = pBar + tapeP * (1 - tapeQ * tapeQ) / (below * below) * qBar;
        pBar = toP;
        qBar = toQ;
        pulledTo = step;
    }

    /** Back to state 0 for another run. */
    void rewind() {
        p = .3;
        q = -.7;
        current = 0;
        pulledTo = u.length;
        tapeIsNewest = false;
        pBar = 0;
        qBar = 0;
        loss = 0;
        advances = 0;
        tapes = 0;
        pulls = 0;
        Arrays.fill(uBar, 0);
    }

    private void move(int step) {
        double next = Math.cos(p) + q + u[step];
        q = p * q / (1 + q * q);
        p = next;
        current++;
    }

    private static void need(boolean holds, String what) {
        if (!holds) {
            throw new AssertionError("the chain was driven wrongly: " + what);
        }
    }

    /** Slow plain twin: every state kept in one array, no plan. */
    static double[] gradientPlainly(int steps) {
        double[] u = controls(steps);
        double[] p = new double[steps + 1];
        double[] q = new double[steps + 1];
        p[0] = .3;
        q[0] = -.7;
        for (int n = 0; n < steps; n++) {
            p[n + 1] = Math.cos(p[n]) + q[n] + u[n];
            q[n + 1] = p[n] * q[n] / (1 + q[n] * q[n]);
        }
        double[] uBar = new double[steps];
        double pBar = 0;
        double qBar = 0;
        for (int n = steps - 1; n >= 0; n--) {
            pBar += weight(n + 1) * p[n + 1];
            uBar[n] = pBar;
            double below = 1 + q[n] * q[n];
            double toP = -Math.sin(p[n]) * pBar + q[n] / below * qBar;
            qBar = pBar + p[n] * (1 - q[n] * q[n]) / (below * below) * qBar;
            pBar = toP;
        }
        return uBar;
    }
}
