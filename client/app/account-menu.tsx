/** Who is signed in, how the pages look, and the way out. */
import {
  Menu,
  MenuChoice,
  MenuItem,
  MenuLabel,
  MenuLink,
  MenuSeparator,
} from '#client/components/ui/menu.tsx'
import { useSignOut } from '#client/features/session/hooks/use-sign-out.ts'
import { useSession } from '#client/lib/session.ts'
import { chooseTheme, themeChoices, useThemeChoice, type ThemeChoice } from '#client/lib/theme.ts'

const themeNames: Record<ThemeChoice, string> = { auto: 'As the system', light: 'Light', dark: 'Dark' }
const themes = themeChoices.map((value) => ({ value, label: themeNames[value] }))

export function AccountMenu() {
  const { person } = useSession()
  const theme = useThemeChoice()
  const signOut = useSignOut()
  return (
    <Menu
      trigger={
        <button
          type="button"
          className="-mr-2 flex min-h-9 items-center gap-2 rounded-md px-2 text-left hover:bg-sunk data-[state=open]:bg-sunk"
        >
          <span className="max-w-40 truncate sm:max-w-64">{person.name}</span>
          <span className="text-sm text-soft max-sm:sr-only">{person.role}</span>
          <svg aria-hidden viewBox="0 0 12 12" className="size-3 stroke-soft" fill="none" strokeWidth="1.6">
            <path d="M2 4l4 4 4-4" />
          </svg>
        </button>
      }
    >
      <MenuLabel>
        <span className="block text-base font-medium text-ink">{person.name}</span>
        {person.email}
        <br />
        {person.role}
      </MenuLabel>
      <MenuSeparator />
      <MenuLabel>Theme</MenuLabel>
      <MenuChoice label="Theme" value={theme} options={themes} onChange={chooseTheme} />
      <MenuSeparator />
      <MenuLink to="/account">Account</MenuLink>
      <MenuItem onSelect={() => signOut.mutate('here')}>Sign out</MenuItem>
    </Menu>
  )
}
