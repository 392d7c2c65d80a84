package org.wispwright.optimize.search;


import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class LbfgsTest {
    @ParameterizedTest(name = "O61 no. {0}, n = {1}")
    @CsvSource({
        "1, 2, 24.2, 0, 46", "2, 2, 400.5, 48.9842536792, 48", "3, 2, 1.13526171734838, 0, 98", "4, 2, 999998000003, 0, 27",
        "5, 2, 14.203125, 0, 18", "6, 2, 4171.30616196049, 124.362182356, 100", "7, 3, 2500, 0, 35",
        "8, 3, 41.681695861678, 0.00821487730658, 27", "9, 3, 3.88810699116668e-6, 1.12793276962e-8, 12",
        "12, 3, 1031.1538106094, 0, 41", "13, 4, 215, 0, 59", "14, 4, 19192, 0, 118",
        "15, 4, 0.00531317227210854, 0.000307505603849, 38", "16, 4, 7926693.33699743, 85822.2016264, 22",
        "18, 6, 0.77907007565597, 0, 171", "20, 6, 30, 0.00228767005355, 62", "20, 9, 30, 1.3997601381e-6, 331",
        "21, 10, 121, 0, 46", "22, 12, 645, 0, 67", "23, 4, 885.06264, 2.2499775009e-5, 73",
        "23, 10, 148032.56535, 7.08765146709e-5, 72", "24, 4, 2.34000880546302, 9.37629300736e-6, 439",
        "24, 10, 162.652776565967, 0.000293660537457, 286", "25, 10, 2198551.1625, 0, 23",
        "26, 10, 0.00707575946622089, 2.79506e-5, 57", "26, 5, 0.0116573789904722, 0, 28", "27, 10, 273.248047828674, 0, 21",
        "28, 10, 0.00078851910126482, 0, 59", "30, 10, 21, 0, 26", "35, 2, 0.197530864197531, 0, 9",
        "35, 5, 0.0509434537418077, 0, 15", "35, 6, 0.0464281722974608, 0, 23", "35, 7, 0.0337706384637188, 0, 24",
        "35, 8, 0.0386176982859303, 0.00351687372568, 31", "35, 9, 0.028882980288226, 0, 37",
        "35, 10, 0.0337632654628801, 0.00650395480088, 37"})
    void o61_probe(int number, int n, double startValue, double least, int good) {
        Lbfgs l = new Lbfgs(MoreGarbowHillstrom.objective(number), MoreGarbowHillstrom.start(number, n), Lbfgs.Settings.standard());
        double f0 = l.value();
        String reached = "never";
        Lbfgs.Iteration it = null;
        for (int k = 0; k < 3000; k++) {
            it = l.step();
            if (reached.equals("never") && Math.abs(l.value() - least) <= (least == 0 ? 1e-12 : 1e-6 * least)) {
                reached = "" + l.evaluations();
            }
            if (it.outcome() != Lbfgs.Outcome.MOVED || l.evaluations() > 3 * good + 200) {
                break;
            }
        }
        System.out.printf("%d n%d start %.1e off, reached %s of %d, end %.12g after %d: %s %s%n", number, n, Math.abs(f0 / startValue - 1), reached, good,
                l.value(), l.evaluations(), it.sentence(), java.util.Arrays.toString(l.x()));
    }
}
