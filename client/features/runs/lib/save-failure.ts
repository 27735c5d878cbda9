import { ApiError, OfflineError } from '#client/lib/api.ts'
import { isAbort } from '#client/lib/engine-context.ts'
import { problemSentence } from '#client/lib/form-problem.ts'

export interface SaveFailure {
  sentence: string
  /** What the server refused in the inputs, one sentence each. */
  details: string[]
}

/** Why a run was not saved, and what to do; what was typed stays in the dialog whatever the reason. */
export function saveFailure(error: unknown): SaveFailure {
  const say = (sentence: string, details: string[] = []) => ({ sentence, details })
  if (error instanceof OfflineError)
    return say(
      'The server cannot be reached. What you typed stays here: try again when it answers. If the connection broke half-way, look at Runs first, the run may be there already.',
    )
  if (isAbort(error))
    return say(
      'Saving was cancelled before the server answered. Look at Runs before saving again: the run may be there already.',
    )
  if (!(error instanceof ApiError)) return say(problemSentence(error))
  switch (error.problem.code) {
    case 'signed-out':
      return say('Your session has ended. Sign in again and save: what you typed stays here.')
    case 'busy':
      return say('The server is computing other runs. Try again in a moment: what you typed stays here.')
    case 'forbidden':
      return say('Your role does not allow you to save runs. Ask an engineer.')
    case 'invalid':
      return say(
        'The server refused these inputs. Correct them in the design, then save again.',
        (error.problem.errors ?? []).map((one) => one.message),
      )
    default:
      return say(problemSentence(error))
  }
}
