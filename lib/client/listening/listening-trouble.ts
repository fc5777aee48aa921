/**
 * Why listening does not begin or does not go on. `not-allowed`: the microphone was refused. `no-microphone`: there is none. `busy`: another
 * program holds it. `asleep`: the browser keeps sound off until the page is pressed. `lost`: the microphone went away. `unsupported`: this browser
 * cannot. `broken`: the sound that came cannot be used.
 */
export type ListeningTrouble = 'not-allowed' | 'no-microphone' | 'busy' | 'asleep' | 'lost' | 'unsupported' | 'broken'

const WORDS: Record<ListeningTrouble, string> = {
  'not-allowed':
    'The microphone is not allowed here. Allow it in the browser’s settings for this page, then listen again. Readings can be typed meanwhile.',
  'no-microphone': 'No microphone found. Plug one in and listen again, or type the reading.',
  busy: 'Another program holds the microphone. Close it and listen again.',
  asleep: 'The browser keeps sound asleep. Press the button once more to listen.',
  lost: 'The microphone went away. What was heard is kept; plug it in and listen again.',
  unsupported: 'This browser cannot listen. Type the reading, or open the page in a newer browser.',
  broken: 'The microphone’s sound cannot be read. Listen again, or type the reading.',
}

/** What happened and what to do, in plain words. */
export function listeningTroubleWords(trouble: ListeningTrouble): string {
  return WORDS[trouble]
}

const BY_NAME: Record<string, ListeningTrouble> = {
  NotAllowedError: 'not-allowed',
  SecurityError: 'not-allowed',
  NotFoundError: 'no-microphone',
  OverconstrainedError: 'no-microphone',
  NotReadableError: 'busy',
  AbortError: 'busy',
  NotSupportedError: 'unsupported',
  TypeError: 'unsupported',
}

/** The trouble behind what getUserMedia or the sound's set-up threw (W3C, Media Capture and Streams 10.2). */
export function listeningTroubleOf(error: unknown): ListeningTrouble {
  return (error instanceof Error || error instanceof DOMException ? BY_NAME[error.name] : undefined) ?? 'broken'
}
