const browsers: readonly [RegExp, string][] = [
  [/\bEdg(e|A|iOS)?\//, 'Edge'],
  [/\b(Firefox|FxiOS)\//, 'Firefox'],
  [/\bSamsungBrowser\//, 'Samsung Internet'],
  [/(Chrome|CriOS|Chromium)\//, 'Chrome or Chromium'],
  [/\bSafari\//, 'Safari'],
]
const systems: readonly [RegExp, string][] = [
  [/\b(iPhone|iPod)\b/, 'a phone (iOS)'],
  [/\biPad\b/, 'a tablet (iPadOS)'],
  [/\bAndroid\b.*\bMobile\b/, 'a phone (Android)'],
  [/\bAndroid\b/, 'a tablet (Android)'],
  [/\bWindows\b/, 'Windows'],
  [/\b(Macintosh|Mac OS X)\b/, 'a Mac'],
  [/\b(Linux|CrOS)\b/, 'Linux'],
]

/** What a browser says of itself, in a few words. Order matters: most browsers also claim to be others. */
export function deviceWords(userAgent: string): string {
  const named = (table: readonly [RegExp, string][]) => table.find(([sign]) => sign.test(userAgent))?.[1]
  const browser = named(browsers)
  const system = named(systems)
  if (browser && system) return `${browser} on ${system}`
  return browser ?? system ?? 'A device that does not say what it is'
}
