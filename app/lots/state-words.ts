import type { VerdictKind } from '@/app/_ui/charts/VerdictMark'
import type { DispositionVerb } from '@/lib/domain/quality/propose-disposition'
import type { LotState } from '@/lib/domain/record/lot-state'

/** Where a lot stands, as it is read, with the mark that goes with the word. */
export const stateWords: Readonly<Record<LotState, { readonly word: string; readonly mark: VerdictKind }>> = {
  measuring: { word: 'measuring', mark: 'waiting' },
  'to-decide': { word: 'to decide', mark: 'waiting' },
  released: { word: 'released', mark: 'within' },
  held: { word: 'on hold', mark: 'near' },
  rework: { word: 'in rework', mark: 'near' },
  regraded: { word: 'regraded', mark: 'near' },
  concession: { word: 'concession', mark: 'near' },
  scrapped: { word: 'scrapped', mark: 'beyond' },
}

/** What can be done with a lot, what it means, and the word of the button. */
export const verbWords: Readonly<
  Record<DispositionVerb, { readonly name: string; readonly meaning: string; readonly button: string }>
> = {
  release: { name: 'Release', meaning: 'All of it may be packed as this product.', button: 'Release' },
  hold: { name: 'Hold', meaning: 'It stays where it is until someone decides.', button: 'Hold' },
  rework: {
    name: 'Rework',
    meaning: 'It goes back to a machine and is measured again.',
    button: 'Send to rework',
  },
  regrade: { name: 'Regrade', meaning: 'It is sold as another product that it meets.', button: 'Regrade' },
  concession: {
    name: 'Concession',
    meaning: 'Released to one customer who has agreed; the reason names customer, quantity and expiry.',
    button: 'Release by concession',
  },
  scrap: { name: 'Scrap', meaning: 'It is cut up; that can’t be undone.', button: 'Scrap' },
}
