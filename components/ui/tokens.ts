/**
 * The colours of the two themes. `app/globals.css` states the same values as CSS variables (a test holds them equal);
 * whatever draws outside CSS, such as a PDF, reads them here.
 */
export const tokens = {
  paper: {
    paper: '#f5f2ea',
    sheet: '#fffdf8',
    wash: '#ece6d8',
    ink: '#1b1813',
    soft: '#6b6355',
    line: '#d9d2c2',
    spike: '#d9442b',
    'spike-text': '#ad2f19',
    reed: '#1d6f5c',
    brass: '#8f5c00',
    plum: '#6d3f73',
  },
  stage: {
    paper: '#15130f',
    sheet: '#1e1b16',
    wash: '#2a261f',
    ink: '#f1ebde',
    soft: '#a89f8d',
    line: '#3a352b',
    spike: '#ff7a5c',
    'spike-text': '#ff7a5c',
    reed: '#5cc9a7',
    brass: '#e6b04a',
    plum: '#c79bd0',
  },
} as const

export type Theme = keyof typeof tokens
export type ColourToken = keyof (typeof tokens)['paper']
