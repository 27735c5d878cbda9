/** The session ended in the middle of work: sign in again over the page, so that nothing typed is lost. */
import { useQueryClient } from '@tanstack/react-query'
import { useEffect, useState } from 'react'
import { useRevalidator } from 'react-router-dom'
import { Dialog } from '#client/components/ui/dialog.tsx'
import { SignInForm } from '#client/features/session/components/sign-in-form.tsx'
import { onSignedOut } from '#client/lib/api.ts'
import { useSession } from '#client/lib/session.ts'

export function SignedOutDialog() {
  const queryClient = useQueryClient()
  const revalidator = useRevalidator()
  const { person } = useSession()
  const [open, setOpen] = useState(false)
  useEffect(() => onSignedOut(() => setOpen(true)), [])

  const resume = () => {
    setOpen(false)
    // Somebody else may have signed in: nothing that the one before saw is taken for granted.
    void queryClient.invalidateQueries({ predicate: (query) => query.queryKey[0] !== 'session' })
    void revalidator.revalidate()
  }

  return (
    <Dialog
      title="Your session has ended"
      description="Sign in again to go on. The page behind stays as it is."
      open={open}
      onOpenChange={setOpen}
      stay
    >
      <SignInForm email={person.email} onSignedIn={resume} />
    </Dialog>
  )
}
