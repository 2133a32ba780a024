/** Largest file that is read, bytes (50 MB). Callers may ask before they read a file into memory. */
export const maximumFileBytes = 50_000_000;
