/**
 * Where vectors live. A {@link dev.estimation.core.space.Space} owns difference and displacement, so
 * that nobody wraps an angle or normalises a quaternion by hand; spaces are joined by {@code and}. Spaces are immutable and may be shared by all threads; their
 * operations cost a few operations per component and allocate nothing.
 */
package dev.estimation.core.space;
