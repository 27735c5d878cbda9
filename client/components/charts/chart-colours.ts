/** Colours of the plots, read from the theme's CSS variables: a canvas cannot use `var(…)`. */
import { useEffect, useState } from 'react'

/** Colours that a series may take; the same colour means the same thing on every page. */
export type ChartColour = 'petrol' | 'copper' | 'plum' | 'moss' | 'slate'

const names = [
  'ink',
  'soft',
  'line',
  'hair',
  'card',
  'petrol',
  'copper',
  'plum',
  'moss',
  'slate',
  'copper-wash',
] as const

export type ChartColours = Record<(typeof names)[number], string>

/** The theme's colours as the browser resolves them now. */
function readColours(): ChartColours {
  const probe = document.createElement('span')
  document.body.append(probe)
  const colours = Object.fromEntries(
    names.map((name) => {
      probe.style.color = `var(--color-${name})`
      return [name, getComputedStyle(probe).color]
    }),
  )
  probe.remove()
  return colours as ChartColours
}

/** The theme's colours, read again when the theme changes by the system's choice or by `data-theme`. */
export function useChartColours(): ChartColours {
  const [colours, setColours] = useState(readColours)
  useEffect(() => {
    const read = () => setColours(readColours())
    const system = window.matchMedia?.('(prefers-color-scheme: dark)')
    const chosen = new MutationObserver(read)
    system?.addEventListener('change', read)
    chosen.observe(document.documentElement, { attributeFilter: ['data-theme', 'class'] })
    return () => {
      system?.removeEventListener('change', read)
      chosen.disconnect()
    }
  }, [])
  return colours
}
