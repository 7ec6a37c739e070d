/**
 * Opens and guards foreign files (recordings, event tables, traces, regions) and writes neutral
 * tables, grid variables and whole result folders. The only place that knows NetCDF. May use
 * refusal and recording.
 */
@NullMarked
package nightjar.storage;

import org.jspecify.annotations.NullMarked;
