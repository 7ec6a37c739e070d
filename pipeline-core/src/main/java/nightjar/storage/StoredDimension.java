package nightjar.storage;

/** A named dimension and its length. */
record StoredDimension(String name, long length) {}
