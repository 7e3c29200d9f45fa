package dev.estimation.benchmarks.study;

import dev.estimation.core.matching.MomentMatching;

/**
 * A way of carrying moments, and the words in which it was asked for.
 *
 * @param typed as given
 * @param matching what it means
 */
record Method(String typed, MomentMatching matching) {}
