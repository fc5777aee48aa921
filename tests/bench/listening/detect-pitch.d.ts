/** Types of detect-pitch 1.1.0. */
declare module 'detect-pitch' {
  /** Period in samples, 0 when there is none. */
  export default function detectPitch(signal: Float32Array, threshold?: number): number
}
