/** Types of fft.js 4.0.4, the part that is used. Complex arrays are real and imaginary parts in turn. */
declare module 'fft.js' {
  export default class FFT {
    /** @param size a power of two, 2 or more */
    constructor(size: number)
    readonly size: number
    createComplexArray(): number[]
    toComplexArray(input: ArrayLike<number>, storage?: number[]): number[]
    transform(out: number[], data: ArrayLike<number>): void
    /** Fills the lower half of `out`; `completeSpectrum` mirrors it into the upper. */
    realTransform(out: number[], data: ArrayLike<number>): void
    completeSpectrum(spectrum: number[]): void
    /** Divides by the size. */
    inverseTransform(out: number[], data: ArrayLike<number>): void
  }
}
