import { useQueryClient } from '@tanstack/react-query'
import { useEffect } from 'react'
import { useNavigate, useSearchParams } from 'react-router-dom'
import { Card } from '#client/components/ui/card.tsx'
import { PageTitle } from '#client/components/ui/page-title.tsx'
import { WaveMark } from '#client/components/wave-mark.tsx'
import { SignInForm } from '#client/features/session/components/sign-in-form.tsx'
import { keepSession } from '#client/lib/api.ts'
import { safeNext } from '#client/lib/next-path.ts'

/** The door. Nothing of whoever was here before stays in memory; after it comes the page that was asked for. */
export function SignInPage({ demo }: { demo: boolean }) {
  const [search] = useSearchParams()
  const navigate = useNavigate()
  const queryClient = useQueryClient()
  useEffect(() => {
    keepSession(null)
    queryClient.clear()
  }, [queryClient])
  return (
    <main
      tabIndex={-1}
      className="mx-auto flex min-h-dvh w-full max-w-100 flex-col justify-center px-4 py-10"
    >
      <PageTitle>Sign in</PageTitle>
      <div className="mb-6 flex items-center justify-center gap-3">
        <WaveMark className="w-12 text-petrol" />
        <h1 className="text-2xl font-semibold">Sinewright</h1>
      </div>
      <Card className="p-6">
        <SignInForm onSignedIn={() => void navigate(safeNext(search.get('next')), { replace: true })} />
      </Card>
      <div className="mt-5 text-center text-sm text-soft *:text-balance">
        <p>Design, prove and sign off RC sine-wave oscillators.</p>
        {demo && <p>This is a demo: its sign-ins are printed where the server was started.</p>}
      </div>
    </main>
  )
}
