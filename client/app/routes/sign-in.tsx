import { useLoaderData, type LoaderFunctionArgs } from 'react-router-dom'
import { SignInPage } from '#client/features/session/sign-in-page.tsx'
import { api } from '#client/lib/api.ts'
import type { Health } from '#shared/schemas/health.ts'

/** Whether this is a demo. A server that does not answer is told of by the form, once somebody signs in. */
export const loader = ({ request }: LoaderFunctionArgs): Promise<boolean> =>
  api.get<Health>('/health', { signal: request.signal }).then(
    ({ mode }) => mode === 'demo',
    () => false,
  )

export function Component() {
  return <SignInPage demo={useLoaderData<boolean>()} />
}
