/**
 * Starting points for the relation between heads (common practice): cents by which the resonant head's tap stands over the batter
 * head's, each tapped beside a lug with the other head damped. That is what a drum tech measures; without air it is the relation of
 * the two heads taken alone. How the heads then pull one note about is `drumTuning`'s to say.
 */
export const HEAD_RELATIONS = [
  { id: 'matched', resonantCents: 0, means: 'Both heads at one pitch: the fullest, longest note.' },
  { id: 'resonant-higher', resonantCents: 300, means: 'Resonant head a minor third higher: shorter, more focused.' },
  { id: 'resonant-lower', resonantCents: -200, means: 'Resonant head a tone lower: deeper, drier, falling in pitch.' },
] as const
