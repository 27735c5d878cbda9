/** Short messages after an action: shown at the foot of the window for a while and announced politely. */
import { createContext, use, useCallback, useEffect, useMemo, useState, type ReactNode } from 'react'

interface StatusMessage {
  id: number
  text: string
}

const visibleFor = 5000
const StatusContext = createContext<(text: string) => void>(() => undefined)

/** Returns `say(text)`. Only for what went well; trouble belongs beside its cause. */
export function useStatus(): (text: string) => void {
  return use(StatusContext)
}

export function StatusProvider({ children }: { children: ReactNode }) {
  const [message, setMessage] = useState<StatusMessage | null>(null)
  const say = useCallback((text: string) => setMessage((before) => ({ id: (before?.id ?? 0) + 1, text })), [])
  useEffect(() => {
    if (!message) return
    const timer = setTimeout(() => setMessage(null), visibleFor)
    return () => clearTimeout(timer)
  }, [message])
  const body = useMemo(() => children, [children])
  return (
    <StatusContext value={say}>
      {body}
      <div
        role="status"
        aria-live="polite"
        data-print="hidden"
        className="pointer-events-none fixed inset-x-4 bottom-5 z-50 flex justify-center"
      >
        {message && (
          <p key={message.id} className="rounded-md bg-ink px-4 py-2 text-paper shadow-float">
            {message.text}
          </p>
        )}
      </div>
    </StatusContext>
  )
}
