import { fireEvent, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { SaveRunDialog } from '#client/features/runs/components/save-run-dialog.tsx'
import { json, problem, renderRuns, serve } from '#tests/client/features/runs/support/render-runs.tsx'
import { makeRun, reviewer } from '#tests/client/features/runs/support/runs.ts'

const run = makeRun()
const dialog = <SaveRunDialog design={run.design} inputs={run.inputs} />
const title = () => screen.getByRole('textbox', { name: 'Title' })
const note = () => screen.getByRole('textbox', { name: 'Note' })
const saveButton = () => screen.getByRole('button', { name: 'Save run' })

async function openAndType() {
  const user = userEvent.setup()
  await user.click(screen.getByRole('button', { name: 'Save run' }))
  await user.type(title(), 'Second article')
  await user.type(note(), 'Shunt C changed.')
  return user
}

afterEach(() => vi.unstubAllGlobals())

describe('SaveRunDialog', () => {
  it('is not offered to a technician', () => {
    renderRuns(dialog, { viewer: { ...reviewer, role: 'technician' } })
    expect(screen.queryByRole('button', { name: 'Save run' })).toBeNull()
  })

  it('says that the server computes again', async () => {
    renderRuns(dialog)
    await userEvent.click(saveButton())
    expect(screen.getByRole('dialog')).toHaveAccessibleDescription(
      /server computes the record and every figure again/,
    )
  })

  it('sends title, note and inputs, then links to the run', async () => {
    const server = serve({ 'POST /api/runs': json(run, 201) })
    renderRuns(dialog)
    const user = await openAndType()
    await user.click(saveButton())
    expect(await screen.findByRole('link', { name: 'Open the run' })).toHaveAttribute('href', '/runs/7')
    const body: unknown = JSON.parse(String(server.mock.calls[0]?.[1]?.body))
    expect(body).toEqual({
      designId: 1,
      title: 'Second article',
      note: 'Shunt C changed.',
      inputs: run.inputs,
    })
  })

  it('asks for a title beside the field and sends nothing', async () => {
    const server = serve({})
    renderRuns(dialog)
    await userEvent.click(saveButton())
    await userEvent.click(saveButton())
    expect(await screen.findByText('Title is missing.')).toBeVisible()
    expect(title()).toHaveAccessibleDescription('Title is missing.')
    expect(server).not.toHaveBeenCalled()
  })

  it.each([
    ['the server is away', {}, /server cannot be reached/],
    ['the session has ended', { 'POST /api/runs': problem(401, 'signed-out') }, /session has ended/],
    ['the server is busy', { 'POST /api/runs': problem(503, 'busy') }, /computing other runs/],
    [
      'the solver fails',
      { 'POST /api/runs': problem(422, 'not-computed', { detail: 'The step became too small at 3 ms.' }) },
      /The step became too small at 3 ms/,
    ],
    [
      'the inputs are refused',
      {
        'POST /api/runs': problem(422, 'invalid', {
          errors: [{ path: ['inputs', 'timing', 'duration'], message: 'Duration spans too many periods.' }],
        }),
      },
      /Duration spans too many periods/,
    ],
  ])('keeps what was typed when %s', async (_, answers, sentence) => {
    serve(answers)
    renderRuns(dialog)
    const user = await openAndType()
    await user.click(saveButton())
    expect(await screen.findByRole('alert')).toHaveTextContent(sentence)
    expect(title()).toHaveValue('Second article')
    expect(note()).toHaveValue('Shunt C changed.')
    await user.click(screen.getByRole('button', { name: 'Cancel' }))
    await user.click(screen.getByRole('button', { name: 'Save run' }))
    expect(title()).toHaveValue('Second article')
  })

  it("shows the server's refusal of the title at the title", async () => {
    const errors = [{ path: ['title'], message: 'A run of this name is there.' }]
    serve({ 'POST /api/runs': problem(422, 'invalid', { errors }) })
    renderRuns(dialog)
    const user = await openAndType()
    await user.click(saveButton())
    await waitFor(() => expect(title()).toHaveAccessibleDescription('A run of this name is there.'))
  })

  it('saves one run however often the button is pressed', async () => {
    let answer: (response: Response) => void = () => undefined
    const server = serve({ 'POST /api/runs': () => new Promise<Response>((resolve) => (answer = resolve)) })
    renderRuns(dialog)
    await openAndType()
    fireEvent.click(saveButton())
    fireEvent.click(screen.getByRole('button', { name: /Save run|Computing/ }))
    fireEvent.submit(title().closest('form')!)
    expect(await screen.findByRole('progressbar', { name: 'Saving the run' })).toBeInTheDocument()
    fireEvent.submit(title().closest('form')!)
    await new Promise((resolve) => setTimeout(resolve))
    answer(json(run, 201))
    await screen.findByText('Run saved')
    expect(server).toHaveBeenCalledTimes(1)
  })
})
