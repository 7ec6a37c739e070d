/**
 * Maps, legends, scale bars and curves as SVG or PNG. Knows nothing of stages. May use refusal and
 * recording.
 */
@NullMarked
package nightjar.picture;

import org.jspecify.annotations.NullMarked;
