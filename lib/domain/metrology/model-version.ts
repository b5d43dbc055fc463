/**
 * Version of the whole chain from readings to results. It changes with any change that can move a stored
 * result by one bit; evaluations of different versions are never mixed in one summary.
 */
export const MODEL_VERSION = '1'
