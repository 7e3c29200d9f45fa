/**
 * The nonlinear functions that moments are carried through. A {@link
 * dev.estimation.core.function.VectorFunction} is a plug-in on plain arrays; what is known of it
 * beyond its values (the inputs it reads, its derivatives) is told by a {@link
 * dev.estimation.core.function.Structure}. {@link dev.estimation.core.function.JacobianCheck} holds that
 * against differences in one call; {@code CentralDifferences}, {@code JacobianDifferences} and {@code
 * SecondDifferences} make derivatives where none are known.
 */
package dev.estimation.core.function;
