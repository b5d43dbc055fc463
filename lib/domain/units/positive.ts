/**
 * A value that a law needs above zero, given back; a RangeError naming symbol and value otherwise. Laws
 * square their inputs: without this a negative length or frequency would pass unnoticed.
 */
export function positive<Q extends number>(symbol: string, value: Q): Q {
  if (!(value > 0) || !Number.isFinite(value))
    throw new RangeError(`${symbol} has to be a finite number above zero, not ${value}`)
  return value
}
