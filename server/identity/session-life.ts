const minute = 60_000

/** How long a sign-in lasts, milliseconds. */
export const sessionLife = {
  /** From sign-in, whatever happens. */
  absolute: 12 * 60 * minute,
  /** Without any request. */
  idle: 2 * 60 * minute,
  /** Of one token; renewed while the session lasts. */
  token: 15 * minute,
  /** Between two notes of "last seen" in the session row: not every reading request should write. */
  seenStep: minute,
} as const
