/**
 * Otsu's threshold, provisional and final mask, smoothing within it, the percent scale (numerics
 * sections 3 to 5). May use film and numeric.
 */
@NullMarked
package nightjar.mask;

import org.jspecify.annotations.NullMarked;
