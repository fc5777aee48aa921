/** How many digits a currency has behind its point (ISO 4217): 2 for EUR, 0 for JPY, 3 for KWD. */
export function minorDigits(currency: string): number {
  return new Intl.NumberFormat('en', { style: 'currency', currency }).resolvedOptions().maximumFractionDigits ?? 2
}

/**
 * A typed amount in integer minor units of its currency: "1250", "1 250,50", "1250.5". Null when it cannot be read, when
 * it has more digits behind the point than the currency, or when it is past a million million minor units.
 */
export function parseMoney(text: string, currency: string): number | null {
  const typed = /^(\d[\d\s\u00a0\u202f]*)(?:[.,](\d+))?$/.exec(text.trim())
  if (!typed) return null
  const digits = minorDigits(currency)
  const fraction = typed[2] ?? ''
  if (fraction.length > digits) return null
  const minor = Number((typed[1] ?? '').replace(/\D/g, '') + fraction.padEnd(digits, '0'))
  return minor <= 1e12 ? minor : null
}

/** An amount as it is typed: "1250.50", without the currency. */
export function typedMoney(minor: number, currency: string): string {
  const digits = minorDigits(currency)
  return (minor / 10 ** digits).toFixed(digits)
}

/** An amount in words: "EUR 1,250.50". */
export function formatMoney(minor: number, currency: string): string {
  const digits = minorDigits(currency)
  const amount = new Intl.NumberFormat('en-GB', { minimumFractionDigits: digits, maximumFractionDigits: digits })
  return `${currency} ${amount.format(minor / 10 ** digits)}`
}
