import { sampleQuantile } from './quantile'

/** Middle value, or the mean of the two middle ones; any order. Undefined for no values. Source: definition. */
export const median = (values: readonly number[]): number | undefined => sampleQuantile(values, 0.5, 7)
