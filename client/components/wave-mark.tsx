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
      <path d="M1 11C2.7 9.1 3.9 9.1 5.6 11C7.2 14.2 8.5 14.2 10.1 11C11.8 5.7 13 5.7 14.7 11C16.4 19.3 17.6 19.3 19.3 11C21 -0.5 22.2 -0.5 23.9 11C25.5 23 26.8 23 28.4 11C30.1 -1 31.3 -1 33 11" />
    </svg>
  )
}
