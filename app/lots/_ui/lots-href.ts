import { type ListLotsInput, lotParameters } from '@/lib/input/lot-list'

/** The address of a list of lots. */
export function lotsHref(asked: ListLotsInput): string {
  const parameters = lotParameters(asked)
  return parameters.size > 0 ? `/lots?${parameters}` : '/lots'
}
