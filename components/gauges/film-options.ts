/** What a film can be, to choose from. */
export const filmOptions = [
  { value: 'coated', label: 'coated' },
  { value: 'clear', label: 'clear' },
  { value: 'other', label: 'other' },
]
