/** Accessibility rules of axe-core (WCAG 2.2 A and AA) over a mounted page. */
import axe from 'axe-core'
import { vi } from 'vitest'

/**
 * Violations as "rule: elements", empty when there are none. Colours and sizes need a browser's layout, which jsdom lacks:
 * the browser tests check those.
 */
export async function axeViolations(element: Element = document.body): Promise<string[]> {
  // jsdom has no canvas, which axe asks for ligatures of icon fonts; we have none.
  vi.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null)
  const result = await axe.run(element, {
    runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'],
    rules: { 'color-contrast': { enabled: false }, 'target-size': { enabled: false } },
  })
  return result.violations.map(
    (violation) => `${violation.id}: ${violation.nodes.map((node) => node.html).join(' | ')}`,
  )
}
