/** The whole method, step by step, as it is printed on every sheet. Common practice throughout. */
export const tuningSteps: readonly { readonly name: string; readonly words: string }[] = [
  {
    name: 'Seat',
    words:
      'Wipe the bearing edge, seat the new head and the hoop square, and run every rod down by finger until it just touches.',
  },
  {
    name: 'Bring up',
    words:
      'Give each rod half a turn in the lug order drawn here. Press the middle of a new head gently with a flat hand, then go round once more.',
  },
  {
    name: 'Gauge pass',
    words:
      'Go round with the gauge in the same order until every lug reads alike. A reading is relative to that gauge: it evens the head, it does not name the note.',
  },
  {
    name: 'Tap pass',
    words:
      'Take the drum off its stand, lay the other head on a soft cloth and rest a fingertip on the middle. Tap a thumb’s width from each lug and bring every tap to the tap pitch, low lugs first.',
  },
  {
    name: 'Other head',
    words: 'Turn the drum over and do the same. Seen facing this head, lug 1 is on the other side of the badge.',
  },
  { name: 'Match', words: 'Go back to the first head: the second one has moved it a little. Even it again.' },
  {
    name: 'Hang and check',
    words: 'Hang the drum, play it with both heads open and listen for warble. Tap again once the stage is warm.',
  },
]

/** Where to begin counting, in words; the drawing shows it too. */
export const lugOneRule =
  'Lug 1 is the first lug clockwise from the badge, seen facing the head you are tuning. Facing the other head, count again from the badge.'
