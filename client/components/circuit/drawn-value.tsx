/** A part's label and value beside it in the drawing, for reading only. */
export function DrawnValue({ label, value }: { label: string; value: string }) {
  return (
    <>
      <span className="block text-xs text-soft">{label}</span>
      <span className="block text-base font-medium whitespace-nowrap">{value}</span>
    </>
  )
}
