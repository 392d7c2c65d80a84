/**
 * Room: benchmarks that need what the flow room keeps to itself. How to run them:
 * {@link org.wispwright.bench}.
 * <p>Doors: {@link org.wispwright.optimize.flow.TransformBench},
 * {@link org.wispwright.optimize.flow.SolidFigures} (a plain program: processor time, not wall time).
 * <p>Words: <i>product</i> = the folded matrix product; <i>fast</i> = the fast cosine transform.
 * <p>May use: optimize.flow, JTransforms.
 */
package org.wispwright.optimize.flow;
