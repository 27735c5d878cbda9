/** Pass or fail, with a sign and a word beside the colour. */
export function Outcome({ passes }: { passes: boolean }) {
  return passes ? <span className="text-ok">✓ passes</span> : <span className="text-bad">✕ fails</span>
}
