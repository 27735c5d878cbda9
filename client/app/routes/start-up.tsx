/** /designs/:designId/start-up */
import { useOutletContext } from 'react-router-dom'
import type { Sheet } from '#client/features/sheet/sheet.ts'
import { StartUpPage } from '#client/features/start-up/start-up-page.tsx'

export function Component() {
  const { content, live } = useOutletContext<Sheet>()
  return <StartUpPage circuit={content.circuit} live={live} />
}
