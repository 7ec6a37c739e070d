/** Values from outside the project that tests are held against, and how to read them. */
@NullMarked
package nightjar.checks;

import org.jspecify.annotations.NullMarked;
