/** A frequency as it is read off: "146.8", to the tenth; whole above 1000. */
export function hertz(hz: number): string {
  return hz >= 1000 ? String(Math.round(hz)) : hz.toFixed(1)
}

/** A film tension in kN/m: "2.01". */
export function kilonewtons(newtonsPerM: number): string {
  return (newtonsPerM / 1000).toFixed(2)
}

const displayUnits: Record<string, (value: number) => { factor: number; unit: string }> = {
  m: (metres) => (metres < 1e-3 ? { factor: 1e6, unit: 'µm' } : { factor: 1e3, unit: 'mm' }),
  Pa: () => ({ factor: 1e-6, unit: 'MPa' }),
}

/** A computed value to four figures with its unit, in the unit that reads best: "254 µm", "11.23 MPa", "0.3531 kg/m²". */
export function figureWords(value: number, unit: string): string {
  const shown = displayUnits[unit]?.(value) ?? { factor: 1, unit }
  // The sign of a negative figure is a minus, as wide as a plus.
  return `${Number((value * shown.factor).toPrecision(4))} ${shown.unit}`.trim().replace('-', '−')
}
