/**
 * The nonlinear functions that moments are carried through. A {@link
 * dev.estimation.core.function.VectorFunction} is a plug-in on plain arrays; what is known of it
 * beyond its values (the inputs it reads, its Jacobian) is told by a {@link
 * dev.estimation.core.function.Structure}.
 */
package dev.estimation.core.function;
