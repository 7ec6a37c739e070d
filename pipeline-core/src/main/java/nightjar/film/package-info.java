/**
 * Rows of float32: the aligned film (every frame by every voxel) and the percent series (kept
 * frames by mask voxels), in memory or on a mapped scratch file. No computation. May use refusal
 * and recording.
 */
@NullMarked
package nightjar.film;

import org.jspecify.annotations.NullMarked;
