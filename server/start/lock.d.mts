/** Types of `lock.mjs` for TypeScript; what the parts mean stands there. */
export function whileLocked<T>(
  file: string,
  step: { waiting?: () => void; work: () => Promise<T> },
): Promise<T>
