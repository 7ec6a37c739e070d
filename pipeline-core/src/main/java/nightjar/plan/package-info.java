/**
 * The plan: YAML to the settings records of the stages and back, with refusals that name line and
 * column. May use the stages' settings.
 */
@NullMarked
package nightjar.plan;

import org.jspecify.annotations.NullMarked;
