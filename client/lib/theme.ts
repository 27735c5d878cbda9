/** Light, dark or as the system says. The choice stands in this browser's storage and as data-theme on <html>. */
import { useSyncExternalStore } from 'react'
import { mediaQuery } from '#client/lib/media.ts'

export const themeChoices = ['auto', 'light', 'dark'] as const
export type ThemeChoice = (typeof themeChoices)[number]
export type Theme = 'light' | 'dark'

const storageKey = 'sinewright.theme'
const systemDark = mediaQuery('(prefers-color-scheme: dark)')
const paper = mediaQuery('print')
const listeners = new Set<() => void>()

/** Storage may be barred by the browser's settings; then the choice lasts as long as the page. */
function stored(): ThemeChoice {
  try {
    const text = localStorage.getItem(storageKey)
    return themeChoices.find((choice) => choice === text) ?? 'auto'
  } catch {
    return 'auto'
  }
}

let choice: ThemeChoice = 'auto'

/** The colour of the browser's own bars: index.html has one for either theme, chosen by `media`. */
function applyToBrowser(): void {
  for (const meta of document.querySelectorAll<HTMLMetaElement>('meta[name=theme-color]')) {
    const of = meta.dataset.of ?? ''
    meta.media = choice === 'auto' ? `(prefers-color-scheme: ${of})` : choice === of ? 'all' : 'not all'
  }
}

function apply(): void {
  const root = document.documentElement
  if (choice === 'auto') delete root.dataset.theme
  else root.dataset.theme = choice
  applyToBrowser()
  for (const listener of listeners) listener()
}

/** Call once at start; follows the system and other tabs from then on. */
export function startTheme(): void {
  choice = stored()
  apply()
  systemDark.subscribe(apply)
  paper.subscribe(apply)
  window.addEventListener('storage', (event) => {
    if (event.key !== storageKey) return
    choice = stored()
    apply()
  })
}

export function chooseTheme(next: ThemeChoice): void {
  choice = next
  try {
    localStorage.setItem(storageKey, next)
  } catch {
    // Barred storage: see `stored`.
  }
  apply()
}

/** As the style sheet has it: never dark on paper. */
function resolved(): Theme {
  if (paper.matches()) return 'light'
  if (choice !== 'auto') return choice
  return systemDark.matches() ? 'dark' : 'light'
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener)
  return () => void listeners.delete(listener)
}

export function useThemeChoice(): ThemeChoice {
  return useSyncExternalStore(subscribe, () => choice)
}

/** The theme in force; charts draw again when it changes. */
export function useTheme(): Theme {
  return useSyncExternalStore(subscribe, resolved)
}
