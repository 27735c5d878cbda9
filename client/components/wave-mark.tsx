/** Our mark: a tone that grows and settles. */
export function WaveMark({ className }: { className?: string }) {
  return (
    <svg
      aria-hidden
      viewBox="0 0 34 22"
      className={className}
      fill="none"
      stroke="currentColor"
      strokeWidth="2"
      strokeLinecap="round"
      strokeLinejoin="round"
    >
      <path d="M1 11c1.2-2.4 2.2-2.4 3.3 0s2 2.6 3 0c1.3-4.6 2.7-4.6 4 0s2.6 5.2 4 0c1.6-8.6 3.4-8.6 5.1 0s3.6 8.8 5.5 0 3.7-9 6.100-2" />
    </svg>
  )
}
