declare module 'fft-js' {
  type ComplexPair = [number, number]
  /** Discrete Fourier transform Σ x[n] exp(−j2πkn/N), unscaled; the length is a power of two. */
  export function fft(samples: ArrayLike<number> | ComplexPair[]): ComplexPair[]
}
