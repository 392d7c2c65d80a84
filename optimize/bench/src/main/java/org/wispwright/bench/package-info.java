/**
 * Room: how long the costly pieces take, one question a class. Nothing uses this room, and the usual build does not make it.
 * <p>Each benchmark first proves that what it times gives the answer that it should, and refuses to run if not.
 * <p>Build and run one, from the project's root:
 * <pre>
 * mvn -q -Pbench -DskipTests package
 * java -jar optimize/bench/target/bench.jar LossBench
 * java -jar optimize/bench/target/bench.jar StepBench -p n=64 -p density=LINEAR -p lanes=1,2
 * java -jar optimize/bench/target/bench.jar MarchBench.pullback -prof gc
 * java -jar optimize/bench/target/bench.jar StepBench -f 1 -wi 1 -i 2 -w 300ms -r 300ms     (only: does it run?)
 * java -jar optimize/bench/target/bench.jar -l                                             (all names)
 * </pre>
 * <p>Figures count only from a machine that does nothing else.
 * <p>Doors: {@link org.wispwright.bench.StepBench}, {@link org.wispwright.bench.MarchBench}, {@link org.wispwright.bench.LossBench},
 * {@link org.wispwright.bench.RetouchBench}, {@link org.wispwright.bench.MatteBench}; in the packages of what they compare, because that is not public:
 * {@link org.wispwright.optimize.flow.TransformBench}, {@link org.wispwright.optimize.force.ForceBench},
 * {@link org.wispwright.optimize.solve.SolveRace}.
 * <p>Words: <i>both sides</i> = the way that is timed and the one that it is held against.
 * <p>May use: render, warp, optimize.
 */
package org.wispwright.bench;
