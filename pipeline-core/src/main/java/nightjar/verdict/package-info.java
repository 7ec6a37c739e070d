/**
 * Limits and reasons of one session (numerics section 14); pure. May use the facts of the stages.
 */
@NullMarked
package nightjar.verdict;

import org.jspecify.annotations.NullMarked;
