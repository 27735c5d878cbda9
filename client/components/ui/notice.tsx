import type { ReactNode } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'

export type Tone = 'info' | 'ok' | 'warn' | 'bad'

const tones: Record<Tone, { box: string; sign: string; word: string }> = {
  info: { box: 'border-petrol/40 bg-petrol-wash', sign: 'i', word: 'Note' },
  ok: { box: 'border-ok/40 bg-ok-wash', sign: '✓', word: 'Done' },
  warn: { box: 'border-warn/50 bg-warn-wash', sign: '!', word: 'Caution' },
  bad: { box: 'border-bad/50 bg-bad-wash', sign: '✕', word: 'Problem' },
}

const signs: Record<Tone, string> = { info: 'text-petrol', ok: 'text-ok', warn: 'text-warn', bad: 'text-bad' }

export interface NoticeProps {
  tone: Tone
  title?: string
  children?: ReactNode
  /** A button or link at the end. */
  action?: ReactNode
  className?: string
}

/** A boxed message in the flow of the page. Trouble is announced at once, the rest politely. */
export function Notice({ tone, title, children, action, className }: NoticeProps) {
  const { box, sign, word } = tones[tone]
  return (
    <div
      role={tone === 'bad' ? 'alert' : 'status'}
      className={classNames('flex items-start gap-2.5 rounded-md border px-3 py-2.5', box, className)}
    >
      <span aria-hidden className={classNames('w-3.5 shrink-0 text-center font-semibold', signs[tone])}>
        {sign}
      </span>
      <div className="min-w-0 grow">
        <span className="sr-only">{word}: </span>
        {title && <p className="font-medium">{title}</p>}
        {children}
      </div>
      {action && <div className="-my-1 shrink-0">{action}</div>}
    </div>
  )
}
