/** The invented people of the demo, Brackwater Probes: each role at least once. None of them exists. */
import type { Role } from '#shared/roles.ts'

export interface DemoAccount {
  name: string
  email: string
  role: Role
  /** Printed at start: these accounts hold invented data only and are refused outside a loopback demo. */
  password: string
}

const account = (name: string, local: string, role: Role): DemoAccount => ({
  name,
  email: `${local}@brackwater.example`,
  role,
  password: `demo-${role}-only`,
})

export const demoAccounts: readonly DemoAccount[] = [
  account('Mara Lindholm', 'mara', 'engineer'),
  account('Tomasz Wrona', 'tomasz', 'engineer'),
  account('Helene Osei', 'helene', 'reviewer'),
  account('Jonas Ekberg', 'jonas', 'technician'),
  account('Priya Sandhu', 'priya', 'technician'),
  account('Sigrid Aune', 'sigrid', 'admin'),
]
