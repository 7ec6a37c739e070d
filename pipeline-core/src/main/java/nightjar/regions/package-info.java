/**
 * Region series, region fits, event-locked responses, trial values (numerics section 12). May use
 * glm, design, film, numeric and inference.
 */
@NullMarked
package nightjar.regions;

import org.jspecify.annotations.NullMarked;
