/**
 * Motion: registration against a reference, resampling, displacement (numerics section 2). May use
 * film and numeric.
 */
@NullMarked
package nightjar.alignment;

import org.jspecify.annotations.NullMarked;
