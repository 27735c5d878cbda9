import { useLayoutEffect, useRef } from 'react'

/** What had focus; for an item of a menu, which is about to vanish, the menu's button. */
function focusedNow(): Element | null {
  const active = document.activeElement
  const menu = active?.closest('[role=menu]')
  return menu ? document.getElementById(menu.getAttribute('aria-labelledby') ?? '') : active
}

/**
 * Remembers what had focus when `open` turned true and returns a way to give it back; where that has gone meanwhile
 * (a row that was archived), the page gets it. Dialogs here are opened by state, so radix knows no trigger to return to.
 */
export function useOpener(open: boolean): () => void {
  const opener = useRef<Element | null>(null)
  // The dialog's content mounts in a later commit than this effect's, so focus has not moved yet.
  useLayoutEffect(() => {
    if (open) opener.current = focusedNow()
  }, [open])
  return () => {
    const target = opener.current?.isConnected ? opener.current : document.querySelector('main')
    if (target instanceof HTMLElement) target.focus()
  }
}
