/**
 * From p values to decisions: adjustment for many voxels or regions (numerics section 10). May use
 * glm, design and numeric.
 */
@NullMarked
package nightjar.inference;

import org.jspecify.annotations.NullMarked;
