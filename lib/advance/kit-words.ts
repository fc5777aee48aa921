import type { FrozenCymbalSpec, FrozenDrumSpec, FrozenHead } from './frozen-kit'

export type Units = 'metric' | 'imperial'

const drumWords: Record<FrozenDrumSpec['role'], string> = {
  kick: 'kick',
  snare: 'snare',
  tom: 'tom',
  'floor-tom': 'floor tom',
}
const cymbalWords: Record<FrozenCymbalSpec['type'], string> = {
  hats: 'hats',
  crash: 'crash',
  ride: 'ride',
  splash: 'splash',
  china: 'china',
  other: 'cymbal',
}
const plyWords = ['', 'one-ply', 'two-ply', 'three-ply']
const dampingWords: Record<FrozenHead['damping'], string> = {
  none: '',
  ring: 'with a damping ring',
  dot: 'with a centre dot',
  gel: 'with gel',
  felt: 'with a felt strip',
}
const millimetresPerInch = 25.4

/** Nominal inches as the trade writes them: 12, 5.5, 6.25. */
export function inchWords(inches: number): string {
  return String(Math.round(inches * 100) / 100)
}

function millimetres(inches: number): string {
  return String(Math.round(inches * millimetresPerInch))
}

/** A drum's size: "12 in across, 8 deep"; for a metric reader with the millimetres behind it. */
export function drumSizeWords(size: { readonly diameterIn: number; readonly depthIn: number }, units: Units): string {
  const nominal = `${inchWords(size.diameterIn)} in across, ${inchWords(size.depthIn)} deep`
  return units === 'imperial'
    ? nominal
    : `${nominal} (${millimetres(size.diameterIn)} × ${millimetres(size.depthIn)} mm)`
}

/** A cymbal's size: "21 in", for a metric reader "21 in (533 mm)". */
export function cymbalSizeWords(diameterIn: number, units: Units): string {
  return units === 'imperial'
    ? `${inchWords(diameterIn)} in`
    : `${inchWords(diameterIn)} in (${millimetres(diameterIn)} mm)`
}

export function drumRoleWord(role: FrozenDrumSpec['role']): string {
  return drumWords[role]
}

export function cymbalTypeWord(type: FrozenCymbalSpec['type']): string {
  return cymbalWords[type]
}

/** A kind of hardware or microphone, or a stand, from its stored name: "boom stand"; a clip-on keeps its hyphen. */
export function typeWords(type: string): string {
  return type === 'clip-on' ? type : type.replaceAll('-', ' ')
}

/** An output of a piece, as it is said: "DI", "click", "L". */
export function outputWords(output: string): string {
  return output === 'di' ? 'DI' : output
}

/** A head by kind, never by maker: "10 mil one-ply coated", "7 + 7 mil two-ply clear with gel". */
export function headWords(head: Pick<FrozenHead, 'plyMils' | 'film' | 'damping'>): string {
  const film = head.film === 'other' ? '' : head.film
  const parts = [
    `${head.plyMils.map(inchWords).join(' + ')} mil`,
    plyWords[head.plyMils.length] ?? '',
    film,
    dampingWords[head.damping],
  ]
  return parts.filter((part) => part !== '').join(' ')
}

/** A range of sizes: "12 to 13 in", or one size when both ends are the same. */
export function rangeWords(low: number, high: number): string {
  return low === high ? `${inchWords(low)} in` : `${inchWords(low)} to ${inchWords(high)} in`
}
