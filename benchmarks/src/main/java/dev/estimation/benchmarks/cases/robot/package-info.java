/** A robot in the plane that drives by commands and sees known landmarks. */
package dev.estimation.benchmarks.cases.robot;
