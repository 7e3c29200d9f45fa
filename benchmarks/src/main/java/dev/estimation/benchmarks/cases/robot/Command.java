package dev.estimation.benchmarks.cases.robot;

/**
 * What the robot was told to do, until it was told something else.
 *
 * @param time s
 * @param speed forward (m/s)
 * @param turnRate counter-clockwise (rad/s)
 */
record Command(double time, double speed, double turnRate) {}
