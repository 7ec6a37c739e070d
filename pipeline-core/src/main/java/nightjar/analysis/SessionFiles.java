package nightjar.analysis;

import java.nio.file.Path;
import org.jspecify.annotations.Nullable;

/**
 * The files of one session.
 *
 * @param recording NetCDF recording
 * @param events event table
 * @param plan what is to be computed
 * @param regions label file or polygons, or null
 * @param traces continuous traces, or null
 */
public record SessionFiles(
    Path recording, Path events, Path plan, @Nullable Path regions, @Nullable Path traces) {}
