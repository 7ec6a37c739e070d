/** The rules of the house, as tests. */
@NullMarked
package nightjar.architecture;

import org.jspecify.annotations.NullMarked;
