/** Who I am here, my password, and the ways out. */
import type { ReactNode } from 'react'
import { Card } from '#client/components/ui/card.tsx'
import { PageHeader } from '#client/components/ui/page-header.tsx'
import { PageTitle } from '#client/components/ui/page-title.tsx'
import { PasswordForm } from '#client/features/account/components/password-form.tsx'
import { roleMeaning } from '#client/features/account/role-meaning.ts'
import { useSession } from '#client/lib/session.ts'

/** `sessions`: the buttons that end sessions, which belong to another feature. */
export function AccountPage({ sessions }: { sessions: ReactNode }) {
  const { person } = useSession()
  const facts = [
    ['Name', person.name],
    ['E-mail', person.email],
    ['Role', `${person.role}: ${roleMeaning[person.role]}`],
  ] as const
  return (
    <>
      <PageTitle>Account</PageTitle>
      <PageHeader title="Account" />
      <div className="grid max-w-4xl items-start gap-4 md:grid-cols-2">
        <Card className="p-5">
          <h2 className="mb-3 text-lg font-medium">Who you are</h2>
          <dl className="grid gap-3">
            {facts.map(([term, fact]) => (
              <div key={term}>
                <dt className="text-sm text-soft">{term}</dt>
                <dd className="wrap-anywhere">{fact}</dd>
              </div>
            ))}
          </dl>
        </Card>
        <Card className="p-5 md:row-span-2">
          <h2 className="mb-3 text-lg font-medium">Change password</h2>
          <PasswordForm />
        </Card>
        <Card className="p-5">
          <h2 className="mb-1 text-lg font-medium">Sessions</h2>
          <p className="mb-3 text-soft">
            “Everywhere” ends every session of yours, on this machine and on any other.
          </p>
          <div className="flex flex-wrap gap-2">{sessions}</div>
        </Card>
      </div>
    </>
  )
}
