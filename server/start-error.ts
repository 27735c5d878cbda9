/**
 * Why the process cannot start, as one sentence for the person who started it. `main.ts` prints the message without a
 * stack and exits with code 1.
 */
export class StartError extends Error {
  override name = 'StartError'
}
