/** Synthetic sessions with known truth. May use storage and recording. */
@NullMarked
package nightjar.demo;

import org.jspecify.annotations.NullMarked;
