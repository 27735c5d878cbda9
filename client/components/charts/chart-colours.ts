/** Colours of the plots, read from the theme's CSS variables: a canvas cannot use `var(…)`. */
import { useTheme, type Theme } from '#client/lib/theme.ts'

/** Colours that a series may take; the same colour means the same thing on every page. */
export type ChartColour = 'petrol' | 'copper' | 'plum' | 'moss' | 'slate'

const names = ['soft', 'hair', 'petrol', 'copper', 'plum', 'moss', 'slate', 'copper-wash'] as const

export type ChartColours = Record<(typeof names)[number], string>

const known = new Map<Theme, ChartColours>()

/** The colours of the theme in force, which is `theme`. Read once for each theme. */
function coloursOf(theme: Theme): ChartColours {
  const found = known.get(theme)
  if (found) return found
  const style = getComputedStyle(document.documentElement)
  const read = Object.fromEntries(
    names.map((name) => [name, style.getPropertyValue(`--color-${name}`).trim()]),
  ) as ChartColours
  known.set(theme, read)
  return read
}

/** The theme's colours; other ones when the theme changes. */
export function useChartColours(): ChartColours {
  return coloursOf(useTheme())
}
