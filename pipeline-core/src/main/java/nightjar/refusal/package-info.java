/**
 * {@link nightjar.refusal.RefusedInput}: the user's input is at fault. Nothing else belongs here;
 * faults of our own are ordinary exceptions. Uses nothing.
 */
@NullMarked
package nightjar.refusal;

import org.jspecify.annotations.NullMarked;
