/**
 * SessionAnalysis: the stages in order, with progress, cancellation and the record of the run. May
 * use all other packages of the core.
 */
@NullMarked
package nightjar.analysis;

import org.jspecify.annotations.NullMarked;
