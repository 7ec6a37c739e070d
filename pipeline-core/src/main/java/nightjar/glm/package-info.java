/**
 * The voxelwise linear model: noise models, generalised least squares by moments, effective degrees
 * of freedom, contrasts (numerics sections 8 and 9). May use design, film and numeric.
 */
@NullMarked
package nightjar.glm;

import org.jspecify.annotations.NullMarked;
