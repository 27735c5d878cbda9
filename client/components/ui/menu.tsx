/** A menu behind a button (radix): arrow keys, typing ahead, Escape. */
import { DropdownMenu } from 'radix-ui'
import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { classNames } from '#client/components/ui/class-names.ts'

const itemClasses =
  'flex min-h-9 items-center gap-2 rounded-sm px-2.5 py-1 text-ink no-underline outline-none select-none data-highlighted:bg-petrol-wash data-disabled:text-soft'

export interface MenuProps {
  /** The button: one element that takes a ref. */
  trigger: ReactNode
  children: ReactNode
  align?: 'start' | 'end'
}

export function Menu({ trigger, children, align = 'end' }: MenuProps) {
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={6}
          collisionPadding={8}
          className="z-50 max-w-80 min-w-48 rounded-lg border border-line bg-card p-1.5 shadow-float"
        >
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  )
}

export interface MenuItemProps {
  onSelect: () => void
  danger?: boolean
  disabled?: boolean
  children: ReactNode
}

export function MenuItem({ onSelect, danger = false, disabled = false, children }: MenuItemProps) {
  return (
    <DropdownMenu.Item
      onSelect={onSelect}
      disabled={disabled}
      className={classNames(itemClasses, 'cursor-pointer', danger && 'text-bad data-highlighted:bg-bad-wash')}
    >
      {children}
    </DropdownMenu.Item>
  )
}

export function MenuLink({ to, children }: { to: string; children: ReactNode }) {
  return (
    <DropdownMenu.Item asChild>
      <Link to={to} className={itemClasses}>
        {children}
      </Link>
    </DropdownMenu.Item>
  )
}

/** Words over a part of the menu. */
export function MenuLabel({ children }: { children: ReactNode }) {
  return <DropdownMenu.Label className="px-2.5 pt-1.5 pb-1 text-sm text-soft">{children}</DropdownMenu.Label>
}

export function MenuSeparator() {
  return <DropdownMenu.Separator className="my-1.5 h-px bg-hair" />
}

export interface MenuChoiceProps<Value extends string> {
  label: string
  value: Value
  options: readonly { value: Value; label: string }[]
  onChange: (value: Value) => void
}

/** One of several, the menu staying open. */
export function MenuChoice<Value extends string>({
  label,
  value,
  options,
  onChange,
}: MenuChoiceProps<Value>) {
  return (
    <DropdownMenu.RadioGroup
      aria-label={label}
      value={value}
      onValueChange={(next) => {
        const option = options.find((candidate) => candidate.value === next)
        if (option) onChange(option.value)
      }}
    >
      {options.map((option) => (
        <DropdownMenu.RadioItem
          key={option.value}
          value={option.value}
          onSelect={(event) => event.preventDefault()}
          className={classNames(itemClasses, 'cursor-pointer')}
        >
          <span aria-hidden className="grid size-4 place-items-center rounded-full border border-edge">
            <DropdownMenu.ItemIndicator className="size-2 rounded-full bg-petrol" />
          </span>
          {option.label}
        </DropdownMenu.RadioItem>
      ))}
    </DropdownMenu.RadioGroup>
  )
}
