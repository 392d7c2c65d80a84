package org.wispwright.optimize.search;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Test functions of Moré, Garbow and Hillstrom (1981), ACM TOMS 7(1), 17-41, by the paper's numbers; f is the sum of squares of
 * the residuals. Gradients by {@link Dual}. Outside check O61.
 */
final class MoreGarbowHillstrom {
    private static final double[] BARD = {.14, .18, .22, .25, .29, .32, .35, .39, .37, .58, .73, .96, 1.34, 2.10, 4.39};
    private static final double[] GAUSSIAN = {.0009, .0044, .0175, .0540, .1295, .2420, .3521, .3989};
    private static final double[] KOWALIK_Y = {.1957, .1947, .1735, .1600, .0844, .0627, .0456, .0342, .0323, .0235, .0246};
    private static final double[] KOWALIK_U = {4, 2, 1, .5, .25, .167, .125, .1, .0833, .0714, .0625};

    private MoreGarbowHillstrom() {
    }

    /** Sum of squares of the residuals of one problem. */
    static Objective objective(int number) {
        return (x, gradient) -> {
            double sum = 0;
            Arrays.fill(gradient, 0);
            for (Dual r : residuals(number, Dual.unknowns(x))) {
                sum += r.value * r.value;
                for (int i = 0; i < gradient.length; i++) {
                    gradient[i] += 2 * r.value * r.by[i];
                }
            }
            return sum;
        };
    }

    /** The paper's starting point. */
    static double[] start(int number, int n) {
        double[] x = new double[n];
        for (int j = 0; j < n; j++) {
            double t = (j + 1.) / (n + 1);
            x[j] = switch (number) {
                case 1, 21 -> j % 2 == 0 ? -1.2 : 1;
                case 2 -> new double[] {.5, -2}[j];
                case 3 -> j;
                case 4, 5, 8 -> 1;
                case 6 -> new double[] {.3, .4}[j];
                case 7 -> j == 0 ? -1 : 0;
                case 9 -> new double[] {.4, 1, 0}[j];
                case 12 -> 10 * j;
                case 13, 22 -> new double[] {3, -1, 0, 1}[j % 4];
                case 14 -> j % 2 == 0 ? -3 : -1;
                case 15 -> new double[] {.25, .39, .415, .39}[j];
                case 16 -> new double[] {25, 5, -5, -1}[j];
                case 18 -> j == 1 ? 2 : 1;
                case 20 -> 0;
                case 23 -> j + 1;
                case 24, 27 -> .5;
                case 25 -> 1 - (j + 1.) / n;
                case 26 -> 1. / n;
                case 28 -> t * (t - 1);
                case 30 -> -1;
                case 35 -> t;
                default -> throw new IllegalArgumentException("no problem " + number);
            };
        }
        return x;
    }

    private static List<Dual> residuals(int number, Dual[] x) {
        List<Dual> r = new ArrayList<>();
        int n = x.length;
        switch (number) {
            case 1, 21 -> {
                for (int j = 0; j < n; j += 2) {
                    r.add(x[j + 1].minus(x[j].square()).times(10));
                    r.add(x[j].times(-1).plus(1));
                }
            }
            case 2 -> {
                r.add(x[0].minus(13).plus(x[1].times(-1).plus(5).times(x[1]).minus(2).times(x[1])));
                r.add(x[0].minus(29).plus(x[1].plus(1).times(x[1]).minus(14).times(x[1])));
            }
            case 3 -> {
                r.add(x[0].times(x[1]).times(1e4).minus(1));
                r.add(x[0].times(-1).exp().plus(x[1].times(-1).exp()).minus(1.0001));
            }
            case 4 -> {
                r.add(x[0].minus(1e6));
                r.add(x[1].minus(2e-6));
                r.add(x[0].times(x[1]).minus(2));
            }
            case 5 -> {
                double[] y = {1.5, 2.25, 2.625};
                for (int i = 1; i <= 3; i++) {
                    r.add(x[0].times(x[1].power(i).times(-1).plus(1)).times(-1).plus(y[i - 1]));
                }
            }
            case 6 -> {
                for (int i = 1; i <= 10; i++) {
                    r.add(x[0].times(i).exp().plus(x[1].times(i).exp()).times(-1).plus(2 + 2 * i));
                }
            }
            case 7 -> {
                Dual turn = x[1].over(x[0]).atan().times(1 / (2 * Math.PI)).plus(x[0].value < 0 ? .5 : 0);
                r.add(x[2].minus(turn.times(10)).times(10));
                r.add(x[0].square().plus(x[1].square()).sqrt().minus(1).times(10));
                r.add(x[2]);
            }
            case 8 -> {
                for (int i = 1; i <= 15; i++) {
                    double v = 16 - i;
                    Dual below = x[1].times(v).plus(x[2].times(Math.min(i, v)));
                    r.add(x[0].plus(x[0].times(0).plus(i).over(below)).times(-1).plus(BARD[i - 1]));
                }
            }
            case 9 -> {
                for (int i = 1; i <= 15; i++) {
                    Dual away = x[2].times(-1).plus((8 - i) / 2.);
                    r.add(x[0].times(x[1].times(away.square()).times(-.5).exp()).minus(GAUSSIAN[i <= 8 ? i - 1 : 15 - i]));
                }
            }
            case 12 -> {
                for (int i = 1; i <= 10; i++) {
                    double t = .1 * i;
                    r.add(x[0].times(-t).exp().minus(x[1].times(-t).exp()).minus(x[2].times(Math.exp(-t) - Math.exp(-10 * t))));
                }
            }
            case 13, 22 -> {
                for (int j = 0; j < n; j += 4) {
                    r.add(x[j].plus(x[j + 1].times(10)));
                    r.add(x[j + 2].minus(x[j + 3]).times(Math.sqrt(5)));
                    r.add(x[j + 1].minus(x[j + 2].times(2)).square());
                    r.add(x[j].minus(x[j + 3]).square().times(Math.sqrt(10)));
                }
            }
            case 14 -> {
                r.add(x[1].minus(x[0].square()).times(10));
                r.add(x[0].times(-1).plus(1));
                r.add(x[3].minus(x[2].square()).times(Math.sqrt(90)));
                r.add(x[2].times(-1).plus(1));
                r.add(x[1].plus(x[3]).minus(2).times(Math.sqrt(10)));
                r.add(x[1].minus(x[3]).times(1 / Math.sqrt(10)));
            }
            case 15 -> {
                for (int i = 0; i < 11; i++) {
                    double u = KOWALIK_U[i];
                    r.add(x[0].times(x[1].times(u).plus(u * u)).over(x[2].times(u).plus(u * u).plus(x[3])).times(-1).plus(KOWALIK_Y[i]));
                }
            }
            case 16 -> {
                for (int i = 1; i <= 20; i++) {
                    double t = i / 5.;
                    r.add(x[0].plus(x[1].times(t)).minus(Math.exp(t)).square()
                            .plus(x[2].plus(x[3].times(Math.sin(t))).minus(Math.cos(t)).square()));
                }
            }
            case 18 -> {
                for (int i = 1; i <= 13; i++) {
                    double t = .1 * i;
                    double y = Math.exp(-t) - 5 * Math.exp(-10 * t) + 3 * Math.exp(-4 * t);
                    r.add(x[2].times(x[0].times(-t).exp()).minus(x[3].times(x[1].times(-t).exp()))
                            .plus(x[5].times(x[4].times(-t).exp())).minus(y));
                }
            }
            case 20 -> watson(x, r);
            case 23 -> {
                Dual sum = x[0].times(0);
                for (Dual xj : x) {
                    r.add(xj.minus(1).times(Math.sqrt(1e-5)));
                    sum = sum.plus(xj.square());
                }
                r.add(sum.minus(.25));
            }
            case 24 -> penaltyTwo(x, r);
            case 25 -> {
                Dual sum = x[0].times(0);
                for (int j = 0; j < n; j++) {
                    r.add(x[j].minus(1));
                    sum = sum.plus(x[j].minus(1).times(j + 1));
                }
                r.add(sum);
                r.add(sum.square());
            }
            case 26 -> {
                Dual sum = x[0].times(0).plus(n);
                for (Dual xj : x) {
                    sum = sum.minus(xj.cos());
                }
                for (int i = 0; i < n; i++) {
                    r.add(sum.plus(x[i].cos().times(-1).plus(1).times(i + 1)).minus(x[i].sin()));
                }
            }
            case 27 -> {
                Dual sum = x[0].times(0);
                Dual product = sum.plus(1);
                for (Dual xj : x) {
                    sum = sum.plus(xj);
                    product = product.times(xj);
                }
                for (int i = 0; i < n - 1; i++) {
                    r.add(x[i].plus(sum).minus(n + 1));
                }
                r.add(product.minus(1));
            }
            case 28 -> {
                double h = 1. / (n + 1);
                Dual zero = x[0].times(0);
                for (int i = 0; i < n; i++) {
                    Dual around = (i == 0 ? zero : x[i - 1]).plus(i == n - 1 ? zero : x[i + 1]);
                    r.add(x[i].times(2).minus(around).plus(x[i].plus((i + 1) * h + 1).power(3).times(h * h / 2)));
                }
            }
            case 30 -> {
                Dual zero = x[0].times(0);
                for (int i = 0; i < n; i++) {
                    Dual around = (i == 0 ? zero : x[i - 1]).plus((i == n - 1 ? zero : x[i + 1]).times(2));
                    r.add(x[i].times(-2).plus(3).times(x[i]).minus(around).plus(1));
                }
            }
            case 35 -> chebyquad(x, r);
            default -> throw new IllegalArgumentException("no problem " + number);
        }
        return r;
    }

    private static void watson(Dual[] x, List<Dual> r) {
        for (int i = 1; i <= 29; i++) {
            double t = i / 29.;
            Dual slope = x[0].times(0);
            Dual sum = x[0];
            for (int j = 1; j < x.length; j++) {
                slope = slope.plus(x[j].times(j * Math.pow(t, j - 1)));
                sum = sum.plus(x[j].times(Math.pow(t, j)));
            }
            r.add(slope.minus(sum.square()).minus(1));
        }
        r.add(x[0]);
        r.add(x[1].minus(x[0].square()).minus(1));
    }

    private static void penaltyTwo(Dual[] x, List<Dual> r) {
        int n = x.length;
        double root = Math.sqrt(1e-5);
        r.add(x[0].minus(.2));
        for (int i = 2; i <= n; i++) {
            double y = Math.exp(i / 10.) + Math.exp((i - 1) / 10.);
            r.add(x[i - 1].times(.1).exp().plus(x[i - 2].times(.1).exp()).minus(y).times(root));
        }
        for (int i = n + 1; i < 2 * n; i++) {
            r.add(x[i - n].times(.1).exp().minus(Math.exp(-.1)).times(root));
        }
        Dual sum = x[0].times(0);
        for (int j = 1; j <= n; j++) {
            sum = sum.plus(x[j - 1].square().times(n - j + 1));
        }
        r.add(sum.minus(1));
    }

    private static void chebyquad(Dual[] x, List<Dual> r) {
        int n = x.length;
        Dual[] before = new Dual[n];
        Dual[] now = new Dual[n];
        for (int j = 0; j < n; j++) {
            before[j] = x[j].times(0).plus(1);
            now[j] = x[j].times(2).minus(1);
        }
        for (int i = 1; i <= n; i++) {
            Dual sum = x[0].times(0);
            for (int j = 0; j < n; j++) {
                sum = sum.plus(now[j]);
                Dual next = x[j].times(2).minus(1).times(2).times(now[j]).minus(before[j]);
                before[j] = now[j];
                now[j] = next;
            }
            r.add(sum.times(1. / n).plus(i % 2 == 0 ? 1. / (i * (double) i - 1) : 0));
        }
    }
}
