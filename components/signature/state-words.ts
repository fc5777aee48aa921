/** How a thing that was asked stands, in the colours and edges every place shares. */
export type StateName = 'settled' | 'waiting' | 'changed' | 'act' | 'none'

export interface StateLook {
  word: string
  /** The left edge: its line differs for each state, so that it tells them apart in black and white too. */
  edge: string
  text: string
}

export const stateLooks: Record<StateName, StateLook> = {
  settled: { word: 'settled', edge: 'border-l-4 border-solid border-reed', text: 'text-reed' },
  waiting: { word: 'waiting', edge: 'border-l-4 border-dashed border-brass', text: 'text-brass' },
  changed: { word: 'changed since', edge: 'border-l-[5px] border-double border-plum', text: 'text-plum' },
  act: { word: 'to do', edge: 'border-l-8 border-solid border-spike', text: 'text-spike-text' },
  none: { word: 'not sent', edge: 'border-l-4 border-dotted border-soft', text: 'text-soft' },
}
