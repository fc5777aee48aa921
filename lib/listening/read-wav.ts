import { AcousticsError } from '@/lib/acoustics/acoustics-error'

export type WavSound = {
  sampleRateHz: number
  /** One channel, full scale ±1: the mean of two where the file has two. */
  samples: Float32Array
}

/** A recording of ten minutes in stereo at 48 kHz and 32 bits has 230 MB; taps are short. */
const MOST_BYTES = 64 * 1024 * 1024
const PCM = 1
const FLOAT = 3
/** The format's own code is then the first two bytes of a longer one. */
const EXTENSIBLE = 0xfffe
/** Written by recorders that do not know the length beforehand. */
const LENGTH_UNKNOWN = 0xffffffff

type Format = { code: number; channels: number; sampleRateHz: number; bits: number; frameBytes: number }

/**
 * Reads a WAV file: PCM of 16, 24 or 32 bits or floats of 32, one channel or two, any chunks before and after.
 * Source of the layout: Microsoft and IBM, Multimedia Programming Interface and Data Specifications 1.0 (1991).
 * @throws AcousticsError not a WAV file, a kind that is not read, sizes that contradict each other, samples that are not finite
 */
export function readWav(file: ArrayBuffer | Uint8Array): WavSound {
  const bytes = file instanceof Uint8Array ? file : new Uint8Array(file)
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  if (bytes.length > MOST_BYTES) throw refuse(`has ${bytes.length} bytes: at most ${MOST_BYTES} are read`)
  if (bytes.length < 12 || word(view, 0) !== 'RIFF' || word(view, 8) !== 'WAVE') throw refuse('is not a WAV file')
  let format: Format | null = null
  for (let at = 12; at + 8 <= bytes.length;) {
    const name = word(view, at)
    const stated = view.getUint32(at + 4, true)
    const start = at + 8
    const rest = bytes.length - start
    if (name === 'data') {
      if (format === null) throw refuse('has its sound before its format')
      const size = stated === LENGTH_UNKNOWN ? rest : stated
      if (size > rest) throw refuse(`ends after ${rest} bytes of sound where ${size} are stated`)
      return { sampleRateHz: format.sampleRateHz, samples: readSamples(view, start, size, format) }
    }
    if (stated > rest) throw refuse('ends within a chunk')
    if (name === 'fmt ') format = readFormat(view, start, stated)
    at = start + stated + (stated % 2)
  }
  throw refuse('has no sound in it')
}

function readFormat(view: DataView, at: number, size: number): Format {
  if (size < 16) throw refuse('has a format that is too short')
  const stated = view.getUint16(at, true)
  if (stated === EXTENSIBLE && size < 40) throw refuse('has a format that is too short')
  const code = stated === EXTENSIBLE ? view.getUint16(at + 24, true) : stated
  const format: Format = {
    code,
    channels: view.getUint16(at + 2, true),
    sampleRateHz: view.getUint32(at + 4, true),
    frameBytes: view.getUint16(at + 12, true),
    bits: view.getUint16(at + 14, true),
  }
  const isRead = (code === PCM && [16, 24, 32].includes(format.bits)) || (code === FLOAT && format.bits === 32)
  if (!isRead)
    throw refuse(`is of kind ${code} with ${format.bits} bits: 16, 24, 32 bit PCM and 32 bit floats are read`)
  if (format.channels !== 1 && format.channels !== 2)
    throw refuse(`has ${format.channels} channels: one or two are read`)
  if (format.frameBytes !== (format.channels * format.bits) / 8) throw refuse('contradicts itself in its format')
  if (format.sampleRateHz < 8000 || format.sampleRateHz > 192_000) {
    throw refuse(`has a rate of ${format.sampleRateHz} Hz: 8000 to 192 000 are read`)
  }
  return format
}

function readSamples(
  view: DataView,
  start: number,
  size: number,
  { code, channels, bits, frameBytes }: Format,
): Float32Array {
  const samples = new Float32Array(Math.floor(size / frameBytes))
  const bytes = bits / 8
  for (let i = 0; i < samples.length; i++) {
    let sum = 0
    for (let channel = 0; channel < channels; channel++)
      sum += one(view, start + i * frameBytes + channel * bytes, code, bits)
    if (!Number.isFinite(sum)) throw refuse(`has a sample that is not a finite number (${i})`)
    samples[i] = sum / channels
  }
  return samples
}

function one(view: DataView, at: number, code: number, bits: number): number {
  if (code === FLOAT) return view.getFloat32(at, true)
  if (bits === 16) return view.getInt16(at, true) / 2 ** 15
  if (bits === 32) return view.getInt32(at, true) / 2 ** 31
  return (view.getUint8(at) + view.getUint8(at + 1) * 2 ** 8 + view.getInt8(at + 2) * 2 ** 16) / 2 ** 23
}

function word(view: DataView, at: number): string {
  return String.fromCharCode(view.getUint8(at), view.getUint8(at + 1), view.getUint8(at + 2), view.getUint8(at + 3))
}

function refuse(what: string): AcousticsError {
  return new AcousticsError('wav', `The file ${what}.`)
}
