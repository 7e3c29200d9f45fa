/**
 * Ready motion models. Units are SI and radians; noise is told by spectral densities, so that any time step works.
 * Each is a {@link dev.estimation.filters.model.Motion}, immutable, with its Jacobian, and allocates nothing but where
 * said.
 *
 * <table>
 *   <caption>Models</caption>
 *   <tr><th>model</th><th>state</th><th>control</th><th>linear in</th><th>noise</th></tr>
 *   <tr><td>{@link dev.estimation.filters.motion.RandomWalk}</td>
 *     <td>any components (unit)</td><td></td><td>all</td><td>of each rate (unit^2/s)</td></tr>
 *   <tr><td>{@link dev.estimation.filters.motion.ConstantVelocity}</td>
 *     <td>positions (m), velocities (m/s) on any number of axes</td><td></td><td>all</td>
 *     <td>acceleration on each axis (m^2/s^3)</td></tr>
 *   <tr><td>{@link dev.estimation.filters.motion.ConstantAcceleration}</td>
 *     <td>positions, velocities, accelerations (m/s^2)</td><td></td><td>all</td>
 *     <td>jerk on each axis (m^2/s^5)</td></tr>
 *   <tr><td>{@link dev.estimation.filters.motion.CorrelatedAcceleration}</td>
 *     <td>positions, velocities, accelerations (m/s^2)</td><td></td><td>all</td>
 *     <td>time constant (s); jerk (m^2/s^5), or deviation of the acceleration (m/s^2), on each axis</td></tr>
 *   <tr><td>{@link dev.estimation.filters.motion.ReceiverClock}</td>
 *     <td>bias, drift (s, s/s or m, m/s)</td><td></td><td>all</td>
 *     <td>phase (s or m^2/s), frequency (1/s or m^2/s^3)</td></tr>
 *   <tr><td>{@link dev.estimation.filters.motion.CoordinatedTurn}</td>
 *     <td>x, y (m), velocity along x, y (m/s), turn rate (rad/s)</td><td></td>
 *     <td>place and velocity, given the turn rate</td>
 *     <td>acceleration on each axis (m^2/s^3), turn acceleration (rad^2/s^3)</td></tr>
 *   <tr><td>{@link dev.estimation.filters.motion.PolarTurn}</td>
 *     <td>x, y (m), speed (m/s), heading (rad), turn rate (rad/s)</td><td></td>
 *     <td>place and speed, given heading and turn rate</td>
 *     <td>acceleration along the course (m^2/s^3), turn acceleration (rad^2/s^3)</td></tr>
 *   <tr><td>{@link dev.estimation.filters.motion.PlanarVehicle}</td>
 *     <td>x, y (m), heading (rad)</td><td>speed (m/s), yaw rate (rad/s)</td>
 *     <td>place and noise of the speed, given heading and noise of the yaw rate</td>
 *     <td>speed (m^2/s), yaw rate (rad^2/s), inside the motion</td></tr>
 *   <tr><td>{@link dev.estimation.filters.motion.GyroscopeAttitude}</td>
 *     <td>unit quaternion, bias (rad/s)</td><td>three rates (rad/s)</td><td>none</td>
 *     <td>rates (rad^2/s), bias (rad^2/s^3)</td></tr>
 *   <tr><td>{@link dev.estimation.filters.motion.FallingBody}, to be integrated</td>
 *     <td>altitude (m), speed down (m/s), ballistic parameter (1/m)</td><td></td><td>none</td>
 *     <td>acceleration (m^2/s^3), ballistic parameter (1/(m^2 s))</td></tr>
 * </table>
 *
 * <p>{@link dev.estimation.filters.motion.MotionBlocks} puts several into one state. A motion that is known by its rate of
 * change is a {@link dev.estimation.filters.motion.ContinuousMotion}, which {@link
 * dev.estimation.filters.motion.IntegratedMotion} integrates.
 */
package dev.estimation.filters.motion;
