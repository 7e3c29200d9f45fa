package dev.estimation.benchmarks.replay;

import java.util.List;

/**
 * What the measurements of a run said.
 *
 * @param accepted rows that updated the estimate
 * @param rejectedRows rows that the gate rejected, counted from 0 over all measurement rows
 * @param logLikelihood sum over accepted rows; NaN if there are none
 * @param meanPerDegree normalised innovation squared per degree of freedom, mean over accepted
 *     rows; NaN if there are none
 */
public record Innovations(
    int accepted, List<Integer> rejectedRows, double logLikelihood, double meanPerDegree) {}
