/** Classes that every kind of text input shares. */
export const inputClasses =
  'min-h-9 w-full min-w-0 rounded-md border border-edge bg-card px-2.5 py-1.5 text-ink placeholder:text-soft transition-colors hover:border-soft focus-visible:border-petrol focus-visible:outline-offset-0 aria-invalid:border-bad disabled:cursor-not-allowed disabled:bg-sunk disabled:text-soft [&[readonly]]:bg-sunk'
