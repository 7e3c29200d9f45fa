/**
 * Point rules: sets of points and weights that stand for the standard normal distribution N(0, I).
 * Unscented, cubature, Gauss-Hermite, sparse grids, random and quasi-random points differ in nothing else; {@code PointMatching} serves
 * them all. Rules and their points are immutable and are made once, when a workspace is.
 *
 * <table>
 *   <caption>Which rule for which need, in n dimensions (of active inputs)</caption>
 *   <tr><th>need</th><th>rule</th><th>points, with the centre</th><th>degree of means</th>
 *     <th>covariances never indefinite</th><th>rounding times</th><th>mind</th></tr>
 *   <tr><td>a safe start</td><td>{@code CubatureRule.degreeThree()}, {@code UnscentedRule.symmetric(kappa)},
 *     kappa not negative</td><td>2 n + 1</td><td>3</td><td>yes</td><td>1</td>
 *     <td>points move out as sqrt(n + kappa), from where functions may look different</td></tr>
 *   <tr><td>points near the mean, in any dimension</td><td>{@code UnscentedRule.atDeviations(s)}</td>
 *     <td>2 n + 1</td><td>3</td><td>yes</td><td>2 n / s^2 - 1, or 1</td>
 *     <td>what happens between s and the tails is not seen</td></tr>
 *   <tr><td>the same, with the parameters of the literature</td>
 *     <td>{@code UnscentedRule.scaled(alpha, beta, kappa)}</td><td>2 n + 1</td><td>3</td>
 *     <td>if beta + alpha^2 kappa / n is not negative</td><td>2 / alpha^2 - 1 at kappa = 0</td>
 *     <td>a small alpha sees little more than derivatives</td></tr>
 *   <tr><td>fourth moments along the axes</td><td>{@code UnscentedRule.symmetric(n -> 3 - n)}</td>
 *     <td>2 n + 1</td><td>3</td><td>to n = 3</td><td>2 n / 3 - 1, or 1</td><td>none of mixed terms</td></tr>
 *   <tr><td>dear models</td><td>{@code SimplexRule.spherical()}</td><td>n + 2</td><td>2</td><td>yes</td>
 *     <td>1</td><td>third moments are wrong; results depend on the order of components</td></tr>
 *   <tr><td>more curvature, more inputs than products can bear</td><td>{@code CubatureRule.degreeFive()}</td>
 *     <td>2 n^2 + 1</td><td>5</td><td>to n = 4</td><td>less than 3</td>
 *     <td>points move out as sqrt(n + 2)</td></tr>
 *   <tr><td>the same, points within sqrt 6 of the mean</td><td>{@code CubatureRule.mcNameeStenger()}</td>
 *     <td>2 n^2 + 1</td><td>5</td><td>to n = 4</td><td>1 + 2 n (n - 4) / 9, or 1</td>
 *     <td>negative weights grow with n</td></tr>
 *   <tr><td>any accuracy in 1 to 3 inputs; a yardstick</td><td>{@code GaussHermiteRule.product(p)}, also
 *     {@code product(3, 5)} for axes that differ</td><td>p^n, one more if p is even</td><td>2 p - 1</td>
 *     <td>yes</td><td>1</td><td>cost grows exponentially in n</td></tr>
 *   <tr><td>rough functions, many inputs</td><td>{@code RandomRule}</td><td>N + 1</td>
 *     <td>0; 2 if standardised</td><td>yes</td><td>1</td><td>errors shrink as 1 / sqrt N</td></tr>
 *   <tr><td>the same, inputs that work apart</td><td>{@code LatinHypercubeRule}</td><td>N + 1</td>
 *     <td>0; 2 if standardised</td><td>yes</td><td>1</td><td>standard errors from replicates</td></tr>
 *   <tr><td>the same, few inputs</td><td>{@code QuasiRandomRule}</td><td>N + 1</td>
 *     <td>0; 2 if standardised</td><td>yes</td><td>1</td><td>errors shrink nearly as 1 / N; standard errors from random
 *     shifts</td></tr>
 *   <tr><td>high accuracy where products are too many</td><td>{@code SparseGridRule}</td>
 *     <td>about (2 n)^q / q! at level q</td><td>2 q + 1 or more</td><td>no</td>
 *     <td>2 to 200</td><td>negative weights grow with n</td></tr>
 * </table>
 *
 * <p>Points tell it themselves: {@code UnitPoints.degree()} (0 where a rule states none), {@code
 * covarianceWeightsPositive()} and {@code weightAmplification()}. Rules of more than {@code
 * UnitPoints.LARGEST_SIZE} points are refused.
 */
package dev.estimation.core.points;
