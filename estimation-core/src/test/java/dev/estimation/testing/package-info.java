/**
 * What tests of every module share: outside values with their provenance, random Gaussians from a
 * seed, functions with known moments, comparisons that state their tolerance, and a meter of
 * allocated bytes.
 */
package dev.estimation.testing;
