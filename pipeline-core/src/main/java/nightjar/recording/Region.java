package nightjar.recording;

/**
 * A named set of voxels.
 *
 * @param name unique within a session
 * @param voxels on the recording's grid; may be empty
 */
public record Region(String name, Mask voxels) {}
