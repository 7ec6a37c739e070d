package nightjar.analysis;

import java.nio.file.Path;
import org.jspecify.annotations.Nullable;

/**
 * The files to be looked at; any of them alone.
 *
 * @param recording NetCDF recording, or null
 * @param events event table, or null
 * @param plan what is to be computed, or null
 * @param regions label file or polygons, or null
 * @param traces continuous traces, or null
 */
public record InspectedFiles(
    @Nullable Path recording,
    @Nullable Path events,
    @Nullable Path plan,
    @Nullable Path regions,
    @Nullable Path traces) {}
