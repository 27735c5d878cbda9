/**
 * Split and single supplies. On a single supply the person states the total and the reference above the negative
 * rail; the model counts rails from the reference, so negative = reference and positive = total − reference.
 */
import type { Supply } from '#shared/schemas/circuit.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

export function withSupply(content: DraftContent, supply: Supply): DraftContent {
  return { ...content, circuit: { ...content.circuit, supply } }
}

export const isSingle = (supply: Supply) => supply.reference !== undefined

export const totalOf = (supply: Supply) => supply.positive + supply.negative

/** @param total V from rail to rail. @param reference V above the negative rail */
export function singleSupply(total: number, reference: number): Supply {
  return { positive: total - reference, negative: reference, reference }
}

/** The same rails, described the other way. */
export function withSupplyKind(content: DraftContent, single: boolean): DraftContent {
  const { supply } = content.circuit
  if (single === isSingle(supply)) return content
  const { positive, negative } = supply
  return withSupply(content, single ? { positive, negative, reference: negative } : { positive, negative })
}
