/**
 * Kernels, stimulus, drift and nuisance columns, the design matrix, its rank and estimability
 * (numerics sections 6 and 7). Sees no film: columns made from data come in as NamedSeries. May use
 * numeric.
 */
@NullMarked
package nightjar.design;

import org.jspecify.annotations.NullMarked;
