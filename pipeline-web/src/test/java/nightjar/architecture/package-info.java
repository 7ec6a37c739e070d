/** Rules about the packages of this module. */
@NullMarked
package nightjar.architecture;

import org.jspecify.annotations.NullMarked;
