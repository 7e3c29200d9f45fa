/**
 * The one question on which all else rests: given u with mean and covariance, and z = g(u), what are
 * the mean and covariance of z and the cross-covariance of u and z?
 *
 * <p>A {@link dev.estimation.core.matching.MomentMatching} is a way of answering; it is immutable and
 * shared by all threads. Its {@link dev.estimation.core.matching.MatchingWorkspace} belongs to one
 * thread, owns all scratch, and allocates nothing after it is built.
 *
 * <table>
 *   <caption>Which matching for which need (n: number of active inputs)</caption>
 *   <tr><th>matching</th><th>evaluations</th><th>exact for</th><th>mind</th></tr>
 *   <tr><td>{@code ToleranceMatching}</td><td>2 n + 3 (5 for n = 1) and what it takes</td><td>quadratic g without mixed
 *     products at least</td><td>a tolerance instead of spread parameters; says how accurate it is; a call costs more arithmetic
 *     than rules with as many points; never indefinite</td></tr>
 *   <tr><td>{@code Linearisation.firstOrder()}</td><td>1 and a Jacobian</td><td>affine g</td>
 *     <td>blind to curvature: bias and a covariance too small where g bends within the spread</td></tr>
 *   <tr><td>{@code Linearisation.secondOrder()}</td><td>1, a Jacobian and a Hessian</td>
 *     <td>quadratic g</td><td>sees the mean alone; never indefinite. Without a Hessian 2 n Jacobians, without
 *     either about 2 n^2 evaluations, and input scales</td></tr>
 *   <tr><td>{@code SpreadLinearisation.firstOrder()}</td><td>2 n + 1</td><td>affine g</td>
 *     <td>slopes over the spread, no derivatives needed; mean and covariance still miss curvature</td></tr>
 *   <tr><td>{@code SpreadLinearisation.secondOrderAlongAxes()}</td><td>2 n + 1</td>
 *     <td>mean to degree 3; quadratic g without mixed products</td><td>never indefinite</td></tr>
 *   <tr><td>{@code SpreadLinearisation.secondOrder()}</td><td>n^2 + n + 1</td><td>quadratic g</td>
 *     <td>no derivatives needed; never indefinite</td></tr>
 *   <tr><td>{@code UnscentedRule}</td><td>2 n + 1</td><td>mean to degree 3</td>
 *     <td>spread parameters; covariance may turn indefinite where beta + alpha^2 kappa / n is
 *       negative</td></tr>
 *   <tr><td>{@code SimplexRule}</td><td>n + 2</td><td>mean to degree 2</td>
 *     <td>depends on the order of inputs; never indefinite unless the centre is negative</td></tr>
 *   <tr><td>{@code CubatureRule}, degree 3</td><td>2 n + 1</td><td>mean to degree 3</td>
 *     <td>points move out as sqrt(n); never indefinite</td></tr>
 *   <tr><td>{@code CubatureRule}, degree 5</td><td>2 n^2 + 1</td><td>mean to degree 5</td>
 *     <td>covariance may turn indefinite from n = 5 on</td></tr>
 *   <tr><td>{@code GaussHermiteRule}</td><td>p^n, one more if p is even</td>
 *     <td>mean to degree 2 p - 1 an axis</td>
 *     <td>cost grows exponentially in n; never indefinite</td></tr>
 *   <tr><td>{@code SparseGridRule}</td><td>about (2 n)^q / q!</td><td>mean to total degree 2 q + 1 or
 *     more</td><td>some weights are negative: covariance may turn indefinite</td></tr>
 *   <tr><td>{@code RandomRule}</td><td>N + 1</td>
 *     <td>nothing; affine g if standardised; mean of odd g if antithetic</td>
 *     <td>error shrinks as 1 / sqrt N; standard errors unless standardised</td></tr>
 *   <tr><td>{@code LatinHypercubeRule}</td><td>N + 1</td><td>nothing; affine g if standardised</td>
 *     <td>gains where inputs work apart; standard errors from replicates</td></tr>
 *   <tr><td>{@code QuasiRandomRule}</td><td>N + 1</td><td>nothing; affine g if standardised</td>
 *     <td>error shrinks nearly as 1 / N for few inputs; standard errors from random shifts</td></tr>
 * </table>
 *
 * <p>Where a function says in what it is linear ({@code Structure.withLinearInputs}), n counts the other active
 * inputs alone for all rules but random draws that are not standardised, and each point takes a Jacobian besides, or one
 * more evaluation for each linear input. Of a coordinated turn over five states with a Jacobian:
 *
 * <table>
 *   <caption>Evaluations, and Jacobians</caption>
 *   <tr><th>rule</th><th>over all five</th><th>over the rate</th></tr>
 *   <tr><td>unscented, alpha = 1, kappa = 0; cubature, degree 3</td><td>11</td><td>3, 2</td></tr>
 *   <tr><td>unscented, alpha = 0.001</td><td>11</td><td>3, 3</td></tr>
 *   <tr><td>Gauss-Hermite, 3 nodes</td><td>243</td><td>3, 3</td></tr>
 *   <tr><td>Gauss-Hermite, 5 nodes</td><td>3125</td><td>5, 5</td></tr>
 * </table>
 *
 * <p>The page of {@code core.points} weighs the rules against each other.
 */
package dev.estimation.core.matching;
