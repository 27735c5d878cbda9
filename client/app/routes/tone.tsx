/** /designs/:designId/tone */
import { useOutletContext } from 'react-router-dom'
import type { Sheet } from '#client/features/sheet/sheet.ts'
import { TonePage } from '#client/features/tone/index.ts'

export function Component() {
  const { live } = useOutletContext<Sheet>()
  return <TonePage live={live} />
}
