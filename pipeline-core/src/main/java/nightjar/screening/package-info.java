/**
 * The gross pass over unaligned frames and the judgement of aligned ones: kept or rejected, with
 * the reason (numerics section 1). May use film and numeric.
 */
@NullMarked
package nightjar.screening;

import org.jspecify.annotations.NullMarked;
