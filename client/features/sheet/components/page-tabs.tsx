import { NavLink, useLocation } from 'react-router-dom'

export interface SheetPage {
  to: string
  name: string
  /** What the user asks there. */
  question: string
}

/** The pages of a design, each with its question. The view in the address stays when one goes to and fro. */
export function PageTabs({ pages }: { pages: readonly SheetPage[] }) {
  const { search } = useLocation()
  return (
    <nav aria-label="Design" className="flex gap-1 border-b border-line">
      {pages.map(({ to, name, question }) => (
        <NavLink
          key={to}
          to={{ pathname: to, search }}
          className="-mb-px border-b-3 border-transparent px-4 pt-1.5 pb-2 text-soft no-underline hover:text-ink aria-[current=page]:border-copper aria-[current=page]:text-ink"
        >
          <span className="block font-medium">{name}</span>
          <span className="block text-sm text-soft">{question}</span>
        </NavLink>
      ))}
    </nav>
  )
}
