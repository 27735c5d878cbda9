/** The invented people of the demo, Brackwater Probes: each role at least once. None of them exists. */
import type { Role } from '#shared/roles.ts'

export interface DemoAccount {
  name: string
  email: string
  role: Role
  /** Printed at start: these accounts hold invented data only and are refused outside a loopback demo. */
  password: string
}

const address = (local: string) => `${local}@brackwater.example`

/** E-mail addresses of those who made designs and runs. */
export const mara = address('mara')
export const tomasz = address('tomasz')
export const helene = address('helene')
export const sigrid = address('sigrid')

const account = (name: string, email: string, role: Role): DemoAccount => ({
  name,
  email,
  role,
  password: `demo-${role}-only`,
})

export const demoAccounts: readonly DemoAccount[] = [
  account('Mara Lindholm', mara, 'engineer'),
  account('Tomasz Wrona', tomasz, 'engineer'),
  account('Helene Osei', helene, 'reviewer'),
  account('Jonas Ekberg', address('jonas'), 'technician'),
  account('Priya Sandhu', address('priya'), 'technician'),
  account('Sigrid Aune', sigrid, 'admin'),
]
