package dev.estimation.benchmarks.cases.robot;

/**
 * A landmark seen by the robot.
 *
 * @param time s
 * @param landmarkX of the landmark, in the world (m)
 * @param landmarkY of the landmark, in the world (m)
 * @param range m
 * @param bearing rad, counter-clockwise from the heading
 */
record Sighting(double time, double landmarkX, double landmarkY, double range, double bearing) {}
