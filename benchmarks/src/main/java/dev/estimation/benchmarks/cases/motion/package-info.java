/** Motion models that several cases share. */
package dev.estimation.benchmarks.cases.motion;
