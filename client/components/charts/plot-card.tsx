/** A card around a plot: title, key in words, and the same data as a table one press away. */
import { useState, type ReactNode } from 'react'
import type { ChartColour } from '#client/components/charts/chart-colours.ts'
import type { PlotTable } from '#client/components/charts/plot-table.ts'
import { Button } from '#client/components/ui/button.tsx'
import { Card } from '#client/components/ui/card.tsx'
import { classNames } from '#client/components/ui/class-names.ts'

export interface KeyItem {
  label: string
  /** `held` and `slew` are the two washes, the rest are lines. */
  sign: ChartColour | 'held' | 'slew'
  dashed?: boolean
}

export interface PlotCardProps {
  title: string
  keyItems?: readonly KeyItem[]
  /** Called only while the table is shown. */
  table?: () => PlotTable
  /** Beside the title: buttons, choices. */
  actions?: ReactNode
  /** The plot. */
  children: ReactNode
  /** Below the plot or its table, as cursor read-outs. */
  footer?: ReactNode
  className?: string
}

const lines: Record<ChartColour, string> = {
  petrol: 'border-petrol',
  copper: 'border-copper',
  plum: 'border-plum',
  moss: 'border-moss',
  slate: 'border-slate',
}

const hatch = {
  backgroundImage: 'repeating-linear-gradient(135deg, var(--color-slate) 0 1px, transparent 1px 4px)',
}

function KeySign({ sign, dashed }: KeyItem) {
  if (sign === 'held') return <span aria-hidden className="h-3 w-5 rounded-xs bg-copper-wash" />
  if (sign === 'slew') return <span aria-hidden className="h-3 w-5 rounded-xs opacity-70" style={hatch} />
  return <span aria-hidden className={classNames('w-5 border-t-2', dashed && 'border-dashed', lines[sign])} />
}

/** Lines and washes with their names. */
export function PlotKey({ items }: { items: readonly KeyItem[] }) {
  return (
    <ul className="flex flex-wrap gap-x-4 gap-y-1 text-sm text-soft">
      {items.map((item) => (
        <li key={item.label} className="flex items-center gap-1.5">
          <KeySign {...item} />
          {item.label}
        </li>
      ))}
    </ul>
  )
}

function DataRows({ title, table }: { title: string; table: PlotTable }) {
  return (
    <div className="px-4 pb-3">
      <p className="mb-2 text-sm text-soft">{table.note}</p>
      <div
        className="max-h-80 overflow-auto rounded border border-line"
        tabIndex={0}
        role="region"
        aria-label={`${title}, table`}
      >
        <table className="w-full border-collapse text-sm">
          <thead className="sticky top-0 bg-sunk">
            <tr>
              {table.columns.map((column) => (
                <th key={column} scope="col" className="px-3 py-1.5 text-right font-medium first:text-left">
                  {column}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {table.rows.map((row) => (
              <tr key={row[0]} className="border-t border-hair">
                {row.map((text, i) => (
                  <td
                    key={table.columns[i]}
                    className="px-3 py-1 text-right whitespace-nowrap first:text-left"
                  >
                    {text}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </div>
  )
}

export function PlotCard({ title, keyItems, table, actions, children, footer, className }: PlotCardProps) {
  const [asTable, setAsTable] = useState(false)
  return (
    <Card className={classNames('break-inside-avoid', className)}>
      <div className="flex flex-wrap items-center gap-x-5 gap-y-1 px-4 pt-3 pb-1">
        <h2 className="text-base font-medium">{title}</h2>
        {keyItems && <PlotKey items={keyItems} />}
        <div className="ml-auto flex flex-wrap items-center gap-1">
          {actions}
          {table && (
            <Button variant="quiet" onClick={() => setAsTable(!asTable)}>
              {asTable ? 'Show as plot' : 'Show as table'}
              <span className="sr-only">: {title}</span>
            </Button>
          )}
        </div>
      </div>
      {table && asTable ? (
        <DataRows title={title} table={table()} />
      ) : (
        <div className="px-2 pb-3">{children}</div>
      )}
      {footer && <div className="border-t border-line">{footer}</div>}
    </Card>
  )
}
