package dev.estimation.core.evidence;

import dev.estimation.core.accuracy.OperatingPoint;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Space;

/**
 * One problem of the evidence.
 *
 * @param function what is carried through
 * @param truth the same function, with what is known of it, so that the reference is easier to find
 * @param output where it goes
 * @param point mean and covariance, noise, and what is given
 */
record Problem(VectorFunction function, VectorFunction truth, Space output, OperatingPoint point) {}
