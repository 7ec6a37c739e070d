/**
 * Value types that every stage shares: grid, frame times, masks, events, labels, motion. No file
 * access, no numerics beyond what a value says of itself. May use refusal.
 */
@NullMarked
package nightjar.recording;

import org.jspecify.annotations.NullMarked;
