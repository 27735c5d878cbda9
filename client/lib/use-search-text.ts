import { useEffect, useEffectEvent, useState } from 'react'

/** Rest after the last key before a list is asked for, ms. */
const typingRest = 250

/**
 * The text of a search field whose search is kept elsewhere, mostly in the address: that follows once typing rests, and
 * the text follows it when it changes by itself (back, a link, "show all").
 */
export function useSearchText(search: string, onSearch: (search: string) => void) {
  const [text, setText] = useState(search)
  // The search as it was last seen, and what this field itself asked for last.
  const [seen, setSeen] = useState(search)
  const [asked, setAsked] = useState(search)
  if (search !== seen) {
    setSeen(search)
    if (search !== asked) {
      setAsked(search)
      setText(search)
    }
  }
  const ask = useEffectEvent((wanted: string) => {
    if (wanted === search) return
    setAsked(wanted)
    onSearch(wanted)
  })
  useEffect(() => {
    const timer = setTimeout(() => ask(text.trim()), typingRest)
    return () => clearTimeout(timer)
  }, [text])
  return [text, setText] as const
}
