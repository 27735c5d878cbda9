/** Width of a plot in CSS pixels. */
import { useEffect, useState, type RefObject } from 'react'
import { useMedia } from '#client/lib/media.ts'

/** Of a plot on paper, which has no observers; the style sheet says the same. Fits A4 and Letter, upright. */
const paperWidth = 600

/** Width of the element, followed as it changes; 0 until it is known. */
export function useWidth(element: RefObject<HTMLElement | null>): number {
  const [width, setWidth] = useState(0)
  const paper = useMedia('print')
  useEffect(() => {
    if (!element.current || typeof ResizeObserver === 'undefined') return
    const observer = new ResizeObserver(([entry]) => entry && setWidth(Math.round(entry.contentRect.width)))
    observer.observe(element.current)
    return () => observer.disconnect()
  }, [element])
  return paper ? paperWidth : width
}
