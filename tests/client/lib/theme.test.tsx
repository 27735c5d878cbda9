import { act, render, screen } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'

const root = document.documentElement

/** A fresh module under a system that prefers dark or light, and can change its mind. */
async function themeUnder(dark: boolean) {
  const list = Object.assign(new EventTarget(), { matches: dark })
  const paper = Object.assign(new EventTarget(), { matches: false })
  vi.stubGlobal('matchMedia', (query: string) => (query === 'print' ? paper : list))
  vi.resetModules()
  const theme = await import('#client/lib/theme.ts')
  theme.startTheme()
  function Shown() {
    return <p>{`${theme.useThemeChoice()} ${theme.useTheme()}`}</p>
  }
  const set = (query: typeof list) => (now: boolean) => {
    query.matches = now
    query.dispatchEvent(new Event('change'))
  }
  return { ...theme, Shown, turn: set(list), print: set(paper) }
}

beforeEach(() => localStorage.clear())
afterEach(() => vi.unstubAllGlobals())

describe('theme', () => {
  it('follows the system until told otherwise', async () => {
    const { Shown, turn } = await themeUnder(true)
    render(<Shown />)
    expect(screen.getByText('auto dark')).toBeInTheDocument()
    expect(root).not.toHaveAttribute('data-theme')
    act(() => turn(false))
    expect(screen.getByText('auto light')).toBeInTheDocument()
  })

  it('is light on paper, so that what is drawn on canvas can be read there', async () => {
    const { Shown, print } = await themeUnder(true)
    render(<Shown />)
    act(() => print(true))
    expect(screen.getByText('auto light')).toBeInTheDocument()
    act(() => print(false))
    expect(screen.getByText('auto dark')).toBeInTheDocument()
  })

  it('keeps a choice, in the document and over a reload', async () => {
    const first = await themeUnder(true)
    render(<first.Shown />)
    act(() => first.chooseTheme('light'))
    expect(screen.getByText('light light')).toBeInTheDocument()
    expect(root).toHaveAttribute('data-theme', 'light')
    delete root.dataset.theme
    await themeUnder(true)
    expect(root).toHaveAttribute('data-theme', 'light')
  })

  it("colours the browser's own bars alike", async () => {
    document.head.innerHTML = ['light', 'dark']
      .map((of) => `<meta name="theme-color" data-of="${of}">`)
      .join('')
    const media = () => [...document.head.querySelectorAll('meta')].map((meta) => meta.media)
    const { chooseTheme } = await themeUnder(false)
    chooseTheme('dark')
    expect(media()).toEqual(['not all', 'all'])
    chooseTheme('auto')
    expect(media()).toEqual(['(prefers-color-scheme: light)', '(prefers-color-scheme: dark)'])
  })

  it('forgets the choice with "auto"', async () => {
    const { chooseTheme } = await themeUnder(false)
    chooseTheme('dark')
    chooseTheme('auto')
    expect(root).not.toHaveAttribute('data-theme')
  })

  it('works for the page where storage is barred', async () => {
    vi.spyOn(Storage.prototype, 'getItem').mockImplementation(() => {
      throw new DOMException('barred', 'SecurityError')
    })
    vi.spyOn(Storage.prototype, 'setItem').mockImplementation(() => {
      throw new DOMException('barred', 'SecurityError')
    })
    const { chooseTheme } = await themeUnder(false)
    chooseTheme('dark')
    expect(root).toHaveAttribute('data-theme', 'dark')
    vi.restoreAllMocks()
  })
})
