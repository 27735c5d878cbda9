import { Button } from '#client/components/ui/button.tsx'
import { AccountPage } from '#client/features/account/account-page.tsx'
import { useSignOut } from '#client/features/session/hooks/use-sign-out.ts'

/** /account, with the ways out that the session has. */
export function Component() {
  const signOut = useSignOut()
  const under = (where: 'here' | 'everywhere') => signOut.isPending && signOut.variables === where
  return (
    <AccountPage
      sessions={
        <>
          <Button busy={under('here')} onClick={() => signOut.mutate('here')}>
            Sign out
          </Button>
          <Button busy={under('everywhere')} onClick={() => signOut.mutate('everywhere')}>
            Sign out everywhere
          </Button>
        </>
      }
    />
  )
}
