package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.FilterKind;

/**
 * A kind of filter, and the words in which it was asked for.
 *
 * @param typed as given
 * @param kind what it means
 */
record Method(String typed, FilterKind kind) {}
