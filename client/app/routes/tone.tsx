/** /designs/:designId/tone */
import { useOutletContext } from 'react-router-dom'
import type { Sheet } from '#client/features/sheet/sheet.ts'
import { TonePage } from '#client/features/tone/tone-page.tsx'

export function Component() {
  const { live } = useOutletContext<Sheet>()
  return <TonePage live={live} />
}
