import { useEditing } from '#client/features/sheet/editing-context.ts'
import type { DrawnFieldProps } from '#client/features/sheet/components/drawn-field.tsx'

/** Most sentences begin with their part's name; the others get it put before them. */
const names = (sentence: string, label: string) => sentence.toLowerCase().startsWith(label.toLowerCase())

/** What is wrong with the values in the drawing, each with the name of its part. */
export function DrawnErrors({ parts }: { parts: readonly DrawnFieldProps[] }) {
  const { field } = useEditing()
  const wrong = parts.flatMap(({ name, label, errorId }) => {
    const { error } = field(name)
    return error ? [{ name, label, errorId, error }] : []
  })
  if (wrong.length === 0) return null
  return (
    <ul
      aria-label="Values to mend in the drawing"
      className="mx-4 mt-2 flex flex-col gap-1 rounded-md border border-bad/60 bg-bad-wash px-3 py-2 text-sm text-bad"
    >
      {wrong.map(({ name, label, errorId, error }) => (
        <li key={name}>
          <p role="alert">
            {!names(error, label) && <b className="font-medium">{label}: </b>}
            <span id={errorId}>{error}</span>
          </p>
        </li>
      ))}
    </ul>
  )
}
