/**
 * Room: the benchmark that needs the flow room's own {@code AxisTransform}, which is not public. How to run it:
 * {@link org.wispwright.bench}.
 * <p>Doors: {@link org.wispwright.optimize.flow.TransformBench}.
 * <p>Words: <i>product</i> = the folded matrix product; <i>fast</i> = the fast cosine transform.
 * <p>May use: optimize.flow, JTransforms.
 */
package org.wispwright.optimize.flow;
