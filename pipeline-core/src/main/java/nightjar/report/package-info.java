/** The report page and the methods text. May use results, picture, plan and the stages. */
@NullMarked
package nightjar.report;

import org.jspecify.annotations.NullMarked;
