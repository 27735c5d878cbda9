import { useSearchParams } from 'react-router-dom'
import { CompareRunsPage } from '#client/features/runs/compare-runs-page.tsx'
import { readId } from '#client/lib/read-id.ts'

/** `/runs/compare?a=1&b=2` */
export function Component() {
  const [params] = useSearchParams()
  return <CompareRunsPage a={readId(params.get('a'))} b={readId(params.get('b'))} />
}
