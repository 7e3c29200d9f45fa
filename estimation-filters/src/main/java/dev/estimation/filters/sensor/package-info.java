/**
 * Ready sensor models. Each is told which {@link dev.estimation.filters.sensor.Components} of the state it reads, so it fits
 * any layout: a state of its own, a block of a larger one, behind a quaternion. Each has its Jacobian, and declares the inputs that it
 * reads and those in which it is linear.
 *
 * <table>
 * <caption>Sensors. d: sight, u = d / |d|, v: velocity of what is seen less that of the observer</caption>
 * <tr><th>sensor</th><th>reads</th><th>given</th><th>measurement</th><th>linear in</th><th>Hessian</th></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.Position}</td><td>any components</td><td></td><td>these, in their units</td><td>all</td><td></td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.Range}</td><td>position</td><td>place (m)</td><td>|d| (m)</td><td></td><td>yes</td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.Bearing}</td><td>position in the plane, heading</td><td>place (m), heading (rad)</td><td>direction of d
 * less heading (rad)</td><td>heading</td><td>yes</td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.RangeAndBearing}</td><td>as a bearing</td><td>as a bearing</td><td>range (m), bearing
 * (rad)</td><td>heading</td><td>yes</td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.RangeAzimuthElevation}</td><td>position in space, heading</td><td>place (m), heading
 * (rad)</td><td>|d| (m), azimuth, elevation (rad)</td><td>heading</td><td></td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.RangeRate}</td><td>position, velocity</td><td>place (m), its velocity (m/s)</td><td>u'v
 * (m/s)</td><td>velocity</td><td></td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.RangeDifference}</td><td>position</td><td>two places (m)</td><td>|d_1| - |d_2|
 * (m)</td><td></td><td></td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.Pseudorange}</td><td>position, clock (m)</td><td>place (m), deviation (m)</td><td>|d| + clock
 * (m)</td><td>clock</td><td>yes</td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.PseudorangeRate}</td><td>position, velocity, drift (m/s)</td><td>place (m), its velocity
 * (m/s)</td><td>u'v + drift (m/s)</td><td>velocity, drift</td><td></td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.KnownVector}</td><td>attitude as a unit quaternion</td><td>vector of the world, any
 * unit</td><td>the vector in the body, same unit</td><td></td><td></td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.Heading}</td><td>an angle</td><td></td><td>the angle (rad)</td><td>all</td><td></td></tr>
 * <tr><td>{@link dev.estimation.filters.sensor.SpeedAndCourse}</td><td>velocity in the plane</td><td></td><td>speed (m/s), course
 * (rad)</td><td></td><td>yes</td></tr>
 * </table>
 *
 * <p><b>Angles.</b> Bearings, azimuths and courses are zero along the first component and grow towards the second. A state
 * of x and y gives the angle of mathematics; one of north and east that of the compass; and of one that keeps east and north, {@code
 * Components.of(1, 0)} are north and east. No sensor wraps an angle: the measurement space does.
 *
 * <p><b>Who moves.</b> A {@link dev.estimation.filters.sensor.Sight} says which end is the state and which is given. A radar on the
 * own ship, whose pose is known: {@code Sight.fromGiven(position).relativeToGivenHeading()}, with place and heading given. A robot that sees
 * known landmarks: {@code Sight.toGiven(position).relativeTo(heading)}, with the landmark given and the pose in the state. Either way the
 * structure and the derivatives stay.
 *
 * <p><b>Several at once.</b> Rows of one sensor, all pseudoranges of an epoch for instance, are one update by {@code
 * FilterWorkspace.port(sensor, maximumRows)}; structure and derivatives stay there too, and points are drawn once for all rows. Different sensors
 * of one time are updates one after another. A sensor of your own for part of a state takes its components in its constructor, as these do:
 * a model is shared by all threads and has no scratch into which a wrapper could copy the part.
 *
 * <p><b>Where there is no answer</b> (a bearing at distance 0, an azimuth straight overhead, a course at rest) measurement or derivative is
 * NaN, never an exception: the step is refused with a status, and the estimate stays as it was. Near such a place, within a few standard deviations of the
 * state, a sensor is far from linear, whatever the method.
 *
 * <p>All sensors are immutable and allocate nothing in a call. A call costs a few dozen operations, a root, and an arc tangent for each angle.
 * Distances must lie between 1e-150 and 1e150 m, since squares are formed. Deviations are standard deviations of white noise: what is
 * the same from row to row (bias, delay, multipath) is no such noise, and belongs into the state or into the process noise.
 *
 * <p><b>Caution.</b> Not certified for any use. In navigation, collision avoidance and wherever an estimate can hurt someone: validate on your own data, keep
 * to the rules of the domain and its licensed practice, keep an independent check, and let a qualified person decide.
 */
package dev.estimation.filters.sensor;
