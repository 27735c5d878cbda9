/** Width of an element in CSS pixels, followed as it changes; 0 until it is known. */
import { useEffect, useState, type RefObject } from 'react'

export function useWidth(element: RefObject<HTMLElement | null>): number {
  const [width, setWidth] = useState(0)
  useEffect(() => {
    if (!element.current || typeof ResizeObserver === 'undefined') return
    const observer = new ResizeObserver(([entry]) => entry && setWidth(Math.round(entry.contentRect.width)))
    observer.observe(element.current)
    return () => observer.disconnect()
  }, [element])
  return width
}
