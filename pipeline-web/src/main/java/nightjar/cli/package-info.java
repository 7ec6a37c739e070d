/**
 * Commands of the launcher (picocli) and the jar's main. May use the core's analysis, plan,
 * recording, refusal, storage and demo.
 */
@NullMarked
package nightjar.cli;

import org.jspecify.annotations.NullMarked;
