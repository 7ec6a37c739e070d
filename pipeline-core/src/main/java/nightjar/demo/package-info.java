/**
 * Synthetic sessions with known truth: the invented whisker-puff experiment of the Saltmarsh
 * imaging core. Settings are public records; how tissue, vessels, motion, noise and responses are
 * made stays here. Nothing of the analysis is used, so that both can be checked against each other.
 * May use storage and recording.
 */
@NullMarked
package nightjar.demo;

import org.jspecify.annotations.NullMarked;
