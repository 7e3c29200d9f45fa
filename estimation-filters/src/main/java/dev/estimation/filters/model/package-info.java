/**
 * The plug-ins: how a state moves ({@link dev.estimation.filters.model.MotionModel}) and what a sensor
 * sees of it ({@link dev.estimation.filters.model.SensorModel}). They see plain arrays, are called by
 * many threads at once, and keep no state that changes. Derivatives are a further interface that a
 * model may have; what it reads of the state is told by its structure.
 *
 * <p>Noise covariances, Jacobians and active inputs are those of differences in the space, with d numbers where
 * a point may have more: a rotation has noise in its three directions, and column j of a Jacobian is the
 * derivative by a displacement of the state along j.
 *
 * <p>{@link dev.estimation.filters.modelcheck.ModelCheck} examines a model of one's own in a unit test.
 */
package dev.estimation.filters.model;
