/**
 * One class a file of the results contract: facts of the stages to tables and grid variables. May
 * use storage and the stages.
 */
@NullMarked
package nightjar.results;

import org.jspecify.annotations.NullMarked;
