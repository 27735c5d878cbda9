import { render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it, vi } from 'vitest'
import { Button } from '#client/components/ui/button.tsx'
import { Checkbox } from '#client/components/ui/checkbox.tsx'
import { Field } from '#client/components/ui/field.tsx'
import { Select } from '#client/components/ui/select.tsx'
import { TextArea } from '#client/components/ui/text-area.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'
import { axeViolations } from '#tests/support/axe.ts'

describe('Field', () => {
  it.each([
    ['input', <TextInput key="i" />],
    ['textarea', <TextArea key="t" />],
    ['select', <Select key="s" />],
  ])('labels and describes the %s inside, the error in place of the hint', (_, input) => {
    const { rerender } = render(
      <Field label="Title" hint="Shown in lists." required>
        {input}
      </Field>,
    )
    const control = screen.getByLabelText('Title')
    expect(control).toHaveAccessibleDescription('Shown in lists.')
    expect(control).toBeRequired()
    expect(control).toBeValid()
    rerender(
      <Field label="Title" hint="Shown in lists." error="Title is missing.">
        {input}
      </Field>,
    )
    expect(control).toHaveAccessibleDescription('Title is missing.')
    expect(control).toBeInvalid()
    expect(screen.getByRole('alert')).toHaveTextContent('Title is missing.')
  })

  it('can keep its label for screen readers', async () => {
    render(
      <main>
        <Field label="Search" labelHidden>
          <TextInput />
        </Field>
        <Checkbox label="Compare run 4" labelHidden />
      </main>,
    )
    expect(screen.getByRole('textbox', { name: 'Search' })).toBeInTheDocument()
    expect(screen.getByRole('checkbox', { name: 'Compare run 4' })).toBeInTheDocument()
    expect(await axeViolations(screen.getByRole('main'))).toEqual([])
  })
})

describe('Button', () => {
  it('does nothing while busy, and says that it is', async () => {
    const press = vi.fn()
    const submit = vi.fn((event: React.FormEvent) => event.preventDefault())
    const form = (busy: boolean) => (
      <form onSubmit={submit}>
        <Button type="submit" busy={busy} onClick={press}>
          Save
        </Button>
      </form>
    )
    const user = userEvent.setup()
    const { rerender } = render(form(true))
    const button = screen.getByRole('button', { name: 'Save' })
    await user.click(button)
    expect(button).toHaveAttribute('aria-busy', 'true')
    expect(press).not.toHaveBeenCalled()
    expect(submit).not.toHaveBeenCalled()
    rerender(form(false))
    await user.click(button)
    expect(press).toHaveBeenCalledTimes(1)
    expect(submit).toHaveBeenCalledTimes(1)
  })

  it('does not submit a form unless told to', async () => {
    const submit = vi.fn((event: React.FormEvent) => event.preventDefault())
    render(
      <form onSubmit={submit}>
        <Button>Cancel</Button>
      </form>,
    )
    await userEvent.click(screen.getByRole('button', { name: 'Cancel' }))
    expect(submit).not.toHaveBeenCalled()
  })
})
