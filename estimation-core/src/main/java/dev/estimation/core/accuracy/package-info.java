/**
 * The means to know the truth about a matching: how wrong is it, here, for this use, and what would be better?
 *
 * <table>
 *   <caption>Which class for which question</caption>
 *   <tr><th>question</th><th>class</th><th>cost in evaluations</th></tr>
 *   <tr><td>Which matching shall I take, for my function at my operating points?</td>
 *     <td>{@link dev.estimation.core.accuracy.Audit}, giving an {@link
 *     dev.estimation.core.accuracy.AuditTable}</td><td>a reference and a call of each matching a point</td></tr>
 *   <tr><td>What are the moments, as exactly as can be had, and how sure is that?</td>
 *     <td>{@link dev.estimation.core.accuracy.ReferenceSearch}, giving {@link
 *     dev.estimation.core.accuracy.ReferenceMoments}</td>
 *     <td>some hundreds if the function is smooth, 1e5 and more if not</td></tr>
 *   <tr><td>How wrong are these moments where they are used?</td>
 *     <td>{@link dev.estimation.core.accuracy.MatchingError}</td><td>none</td></tr>
 *   <tr><td>How much of the output does a linear regression on the input miss?</td>
 *     <td>{@link dev.estimation.core.accuracy.CarriedMoments#unexplainedShare()}</td><td>none</td></tr>
 *   <tr><td>Are a mean and covariance all there is to say of the output?</td>
 *     <td>{@link dev.estimation.core.accuracy.MardiaMeasures}</td><td>those of the samples</td></tr>
 *   <tr><td>What comes out if the input is not Gaussian?</td>
 *     <td>{@link dev.estimation.core.accuracy.SampledOutput}</td><td>one a sample</td></tr>
 * </table>
 *
 * <p>Precision: references of smooth functions to 1e-6 of a standard deviation or as asked, others to about 1e-3; each
 * says which it is. Nothing here is meant for the step path: everything allocates.
 */
package dev.estimation.core.accuracy;
