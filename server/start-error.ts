/** Why the process cannot start, as one sentence for the person who started it; see `endWith`. */
export class StartError extends Error {
  override name = 'StartError'
}

/** Ends the process with code 1: with the sentence of a `StartError`, or the stack of anything unforeseen. */
export function endWith(error: unknown): never {
  process.stderr.write(`${error instanceof StartError ? error.message : (error as Error).stack}\n`)
  process.exit(1)
}
