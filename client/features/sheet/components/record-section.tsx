/** How long and how finely the record is computed. */
import { CardSection, FieldGrid } from '#client/features/sheet/components/card-section.tsx'
import { SheetField } from '#client/features/sheet/components/sheet-field.tsx'
import type { LiveResult } from '#client/lib/live-result.ts'
import { formatQuantity } from '#shared/units/format.ts'

const automatic = (seconds: number | undefined) =>
  seconds === undefined ? 'automatic' : `auto: ${formatQuantity(seconds, 's')}`

export function RecordSection({ grid }: { grid: LiveResult['grid'] }) {
  return (
    <CardSection title="Record">
      <FieldGrid>
        <SheetField name="duration" placeholder={automatic(grid?.duration)} />
        <SheetField name="sampleInterval" placeholder={automatic(grid?.sampleInterval)} />
      </FieldGrid>
      <p className="text-sm text-soft">
        Left empty, they are chosen to show the start-up and some settled periods.
      </p>
    </CardSection>
  )
}
