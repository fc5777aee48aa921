/** The whole method, step by step, as it is printed on every sheet. Common practice throughout. */
export const tuningSteps: readonly { readonly name: string; readonly words: string }[] = [
  {
    name: 'Seat',
    words:
      'Wipe the bearing edge, seat head and hoop square, and run the rods down finger-tight, working across the drum.',
  },
  {
    name: 'Bring up',
    words:
      'Quarter turns in the lug order drawn here, two keys on facing lugs, until the tap is near its pitch from below.',
  },
  {
    name: 'Read',
    words:
      'Read every lug before you touch one: first with a gauge, then by tapping. Do not chase a single low lug, unless it has plainly slipped or is loose.',
  },
  {
    name: 'Even',
    words:
      'Head over on the whole: bring the high facing pair down. Under: bring the low pair up. Then read every lug again.',
  },
  {
    name: 'Finish',
    words: 'One or two passes round in small turns. Arrive at every lug from below: go under, then come up into it.',
  },
  {
    name: 'Other head',
    words: 'Turn the drum over and do the same. Seen facing this head, lug 1 is on the other side of the badge.',
  },
  { name: 'Match', words: 'Go back to the first head: the second one has moved it a little. Even it again.' },
  {
    name: 'Hang and check',
    words:
      'Hang the drum or stand it up, play it with both heads open and listen for warble. Tap again once the stage is warm and a new head has settled.',
  },
]

/** How a tap is taken, so that it sounds one head and nothing else. Common practice; the reason is in the acoustics. */
export const tapProtocol =
  'Drum off its stand, the other head laid on a soft cloth, a fingertip on the centre. Tap an inch from the rod with a stick’s tip or a fingernail, alike at every lug, and wait for the pitch to stop falling.'

/** Where to begin counting, in words; the drawing shows it too. */
export const lugOneRule =
  'Lug 1 is the first lug clockwise from the badge, seen facing the head you are tuning. Facing the other head, count again from the badge.'
