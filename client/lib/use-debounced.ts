import { useEffect, useState } from 'react'

/** `value` as it was once it has rested for `delay` milliseconds. */
export function useDebounced<T>(value: T, delay: number): T {
  const [rested, setRested] = useState(value)
  useEffect(() => {
    const timer = setTimeout(() => setRested(value), delay)
    return () => clearTimeout(timer)
  }, [value, delay])
  return rested
}
