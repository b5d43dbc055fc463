import { evaluateSpecimen } from '../metrology/evaluate-specimen'
import type { EvaluationContext, SpecimenEvaluation } from '../metrology/evaluation'
import type { SpecimenSheet } from '../metrology/sheet'
import { canonicalJson } from './canonical-json'

export interface StoredInputs {
  readonly snapshot: { readonly body: string; readonly hash: string }
  /** SHA-256 over sheet and snapshot: what the evaluation rests on, whole. */
  readonly inputHash: string
}

/** SHA-256 of a text in UTF-8, as lower-case hexadecimal. Passed in: hashing is no matter of this layer. */
export type Sha256 = (text: string) => string

export const inputsOf = (sheet: SpecimenSheet, context: EvaluationContext, sha256: Sha256): StoredInputs => {
  const body = canonicalJson(context)
  const hash = sha256(body)
  return { snapshot: { body, hash }, inputHash: sha256(canonicalJson({ sheet, snapshot: hash })) }
}

/**
 * Evaluates what will be read back from the store, not what was handed in: whoever computes the evaluation
 * again from the stored texts gets the same bits.
 */
export const evaluateStored = (sheet: SpecimenSheet, snapshotBody: string): SpecimenEvaluation =>
  evaluateSpecimen(
    JSON.parse(canonicalJson(sheet)) as SpecimenSheet,
    JSON.parse(snapshotBody) as EvaluationContext,
  )
