/**
 * Arrays in, arrays out: transforms, splines, lagged products, small solves, tails of
 * distributions, parallel ranges. Knows nothing of sessions. May use refusal and recording.
 */
@NullMarked
package nightjar.numeric;

import org.jspecify.annotations.NullMarked;
