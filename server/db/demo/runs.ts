/** The invented runs of the demo. Titles and notes are typed in, results never: a note quotes no figure. */
import { helene, mara, sigrid, tomasz } from '#server/db/demo/accounts.ts'
import type { DemoDesignKey } from '#server/db/demo/designs.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'

export interface DemoRun {
  design: DemoDesignKey
  /** E-mail of whoever saved it. */
  author: string
  title: string
  note: string
  /** What differs from the design's draft. */
  change?: (draft: RunInputs) => RunInputs
}

const invented = (text: string) => `${text}\n\nInvented demo data.`

export const demoRuns: readonly DemoRun[] = [
  {
    design: 'bare',
    author: mara,
    title: 'Power-on as drawn',
    note: invented(
      'The gain pair as on the first board. Both rails are reached, as expected without control.',
    ),
    change: (draft) => ({ ...draft, timing: { duration: 60e-3, sampleInterval: 2e-6 } }),
  },
  {
    design: 'bare',
    author: tomasz,
    title: 'Negative rail comes up late',
    note: invented(
      'Asked by production: does it matter that the inverter for the negative rail starts late?',
    ),
    change: (draft) => ({
      ...draft,
      stimulus: {
        kind: 'ramp',
        positive: { delay: 0, riseTime: 2e-3 },
        negative: { delay: 5e-3, riseTime: 2e-3 },
      },
    }),
  },
  {
    design: 'bare',
    author: helene,
    title: 'Tired battery',
    note: invented('The same board at the end of the discharge, to see what the cell still gets.'),
    change: (draft) => ({
      ...draft,
      circuit: { ...draft.circuit, supply: { positive: 6.5, negative: 7 } },
    }),
  },
  {
    design: 'diodes',
    author: mara,
    title: 'Diodes fitted',
    note: invented('Compare with the bare exciter: the level now stays clear of the rails.'),
  },
  {
    design: 'lamp',
    author: tomasz,
    title: 'Warm-up of the filament',
    note: invented('Look at the bounce of the envelope while the filament warms up.'),
  },
  {
    design: 'tracer',
    author: tomasz,
    title: 'One cell pack, reference at half',
    note: invented('Single supply, the tracer clip as load.'),
  },
  {
    design: 'mismatched',
    author: mara,
    title: 'Why the first article sounded harsh',
    note: invented('The kit held the wrong shunt resistor. Kept as evidence of what the fault looks like.'),
  },
  {
    design: 'silent',
    author: sigrid,
    title: 'Dies away after a kick',
    note: invented('Even when pushed it does not keep going: the gain pair is too low.'),
  },
]
