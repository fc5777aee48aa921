/** RIFF header of 44 bytes and 16-bit mono samples, clipped to full scale: what Chromium takes for a microphone. */
export function wavFile(sound: Float64Array, sampleRateHz: number): Buffer {
  const bytes = Buffer.alloc(44 + 2 * sound.length)
  bytes.write('RIFF', 0, 'latin1')
  bytes.writeUInt32LE(bytes.length - 8, 4)
  bytes.write('WAVEfmt ', 8, 'latin1')
  bytes.writeUInt32LE(16, 16)
  bytes.writeUInt16LE(1, 20)
  bytes.writeUInt16LE(1, 22)
  bytes.writeUInt32LE(sampleRateHz, 24)
  bytes.writeUInt32LE(2 * sampleRateHz, 28)
  bytes.writeUInt16LE(2, 32)
  bytes.writeUInt16LE(16, 34)
  bytes.write('data', 36, 'latin1')
  bytes.writeUInt32LE(2 * sound.length, 40)
  sound.forEach((value, i) => bytes.writeInt16LE(Math.round(32_767 * Math.max(-1, Math.min(1, value))), 44 + 2 * i))
  return bytes
}
