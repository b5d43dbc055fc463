/**
 * Standard acceleration of gravity, m/s²: a conventional value, for comparison with the local one.
 * Source: 3rd General Conference on Weights and Measures (1901).
 */
export const STANDARD_GRAVITY = 9.80665
