/**
 * The report page and the methods text: takes finished facts, computes nothing but counts. May use
 * picture, plan, results and the stages.
 */
@NullMarked
package nightjar.report;

import org.jspecify.annotations.NullMarked;
