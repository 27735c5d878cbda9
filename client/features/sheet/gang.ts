/** Editing the two R and the two C as one, and how far apart they are when split. */
import type { Network } from '#shared/schemas/circuit.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

type Part = keyof Network

const twins: Record<Part, Part> = {
  seriesR: 'shuntR',
  shuntR: 'seriesR',
  seriesC: 'shuntC',
  shuntC: 'seriesC',
}

function withNetwork(content: DraftContent, change: Partial<Network>): DraftContent {
  const { circuit } = content
  return { ...content, circuit: { ...circuit, network: { ...circuit.network, ...change } } }
}

/** Sets one part, and its twin with it while they are ganged. */
export function withPart(content: DraftContent, part: Part, value: number): DraftContent {
  return withNetwork(content, content.ganged ? { [part]: value, [twins[part]]: value } : { [part]: value })
}

/** Gangs the arms, the shunt arm taking the series arm's values, or splits them where they are. */
export function withGang(content: DraftContent, ganged: boolean): DraftContent {
  const { seriesR, seriesC } = content.circuit.network
  const network = ganged ? withNetwork(content, { shuntR: seriesR, shuntC: seriesC }) : content
  return { ...network, ganged }
}

/** Shunt over series, less one: 0.01 when the shunt part is 1 % larger. */
export function mismatch({ seriesR, seriesC, shuntR, shuntC }: Network): { r: number; c: number } {
  return { r: shuntR / seriesR - 1, c: shuntC / seriesC - 1 }
}
