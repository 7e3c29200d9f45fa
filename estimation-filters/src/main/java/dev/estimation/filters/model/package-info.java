/**
 * The plug-ins: how a state moves ({@link dev.estimation.filters.model.MotionModel}) and what a sensor
 * sees of it ({@link dev.estimation.filters.model.SensorModel}). They see plain arrays, are called by
 * many threads at once, and keep no state that changes. Derivatives are a further interface that a
 * model may have; what it reads of the state is told by its structure.
 */
package dev.estimation.filters.model;
