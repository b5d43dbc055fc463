/** Stands in for `server-only`, which throws in plain Node. */
export {}
