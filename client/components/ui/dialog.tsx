/** A modal dialog (radix): traps focus, closes with Escape, gives focus back. */
import { Dialog as Radix, VisuallyHidden } from 'radix-ui'
import type { ReactNode } from 'react'
import { useOpener } from '#client/components/ui/use-opener.ts'

export interface DialogProps {
  title: string
  /** A sentence under the title that the dialog is also described by. */
  description?: ReactNode
  open: boolean
  onOpenChange: (open: boolean) => void
  children?: ReactNode
  /** Buttons, the main one last. */
  footer?: ReactNode
  /** Refuses Escape and presses outside, where nothing sensible lies behind. */
  stay?: boolean
}

/** Focus begins at what is asked for, else at the first button of the footer, never at "Close". */
function focusFirst(event: Event) {
  const content = event.currentTarget
  if (!(content instanceof HTMLElement)) return
  const first =
    content.querySelector<HTMLElement>('[data-part=body] :is(input, select, textarea):enabled') ??
    content.querySelector<HTMLElement>('[data-part=footer] button:enabled')
  if (!first) return
  event.preventDefault()
  first.focus()
}

export function Dialog({
  title,
  description,
  open,
  onOpenChange,
  children,
  footer,
  stay = false,
}: DialogProps) {
  const giveBack = useOpener(open)
  const hold = (event: Event) => {
    if (stay) event.preventDefault()
  }
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        {/* Not radix's own veil: that one locks scrolling with an inline style sheet, which the CSP refuses. */}
        <div className="fixed inset-0 z-40 bg-veil" />
        <Radix.Content
          // Radix ties the description by itself; told so where there is none.
          {...(!description && { 'aria-describedby': undefined })}
          onOpenAutoFocus={focusFirst}
          onCloseAutoFocus={(event) => {
            event.preventDefault()
            giveBack()
          }}
          onEscapeKeyDown={hold}
          onInteractOutside={hold}
          className="fixed top-[min(18vh,10rem)] left-1/2 z-50 flex max-h-[calc(100dvh-2*min(9vh,5rem))] w-[min(30rem,calc(100vw-2rem))] -translate-x-1/2 flex-col rounded-lg border border-line bg-card shadow-float focus:outline-none max-sm:top-4 max-sm:max-h-[calc(100dvh-2rem)]"
        >
          <div className="flex items-start gap-4 px-5 pt-4 pb-2">
            <Radix.Title className="grow text-lg font-medium">{title}</Radix.Title>
            {!stay && (
              <Radix.Close className="-mt-1 -mr-2 grid size-8 shrink-0 place-items-center rounded-md text-soft hover:bg-sunk hover:text-ink">
                <svg
                  aria-hidden
                  viewBox="0 0 16 16"
                  className="size-4"
                  fill="none"
                  stroke="currentColor"
                  strokeWidth="1.5"
                >
                  <path d="M3.5 3.5l9 9m0-9l-9 9" />
                </svg>
                <VisuallyHidden.Root>Close</VisuallyHidden.Root>
              </Radix.Close>
            )}
          </div>
          <div data-part="body" className="min-h-0 grow space-y-3 overflow-y-auto px-5 pb-5">
            {description && <Radix.Description className="text-soft">{description}</Radix.Description>}
            {children}
          </div>
          {footer && (
            <div
              data-part="footer"
              className="flex flex-wrap justify-end gap-2 border-t border-hair px-5 py-3"
            >
              {footer}
            </div>
          )}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
