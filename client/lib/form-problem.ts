/** Puts the server's refusal where it belongs: at the field it names, or over the form. */
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'
import { ApiError, OfflineError } from '#client/lib/api.ts'

/** A sentence for any failure of a request. */
export function problemSentence(error: unknown): string {
  if (error instanceof ApiError || error instanceof OfflineError) return error.message
  return 'Something went wrong in this page. Reload it and try again.'
}

/**
 * Shows `error` in the form. Field errors whose path is one of `fields` go to the field, the first one focused;
 * everything else becomes the form's own error (`formState.errors.root`).
 */
export function showProblem<Values extends FieldValues>(
  form: Pick<UseFormReturn<Values>, 'setError'>,
  error: unknown,
  fields: readonly FieldPath<Values>[],
): void {
  const stated = error instanceof ApiError ? (error.problem.errors ?? []) : []
  const known = stated.flatMap(({ path, message }) => {
    const field = fields.find((name) => name === path.join('.'))
    return field ? [{ field, message }] : []
  })
  known.forEach(({ field, message }, index) =>
    form.setError(field, { type: 'server', message }, { shouldFocus: index === 0 }),
  )
  if (known.length === 0) form.setError('root', { type: 'server', message: problemSentence(error) })
}
