import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { Button } from './button'
import { Checkbox } from './checkbox'
import { Field } from './field'
import { Notice } from './notice'
import { NumberInput } from './number-input'
import { RadioGroup } from './radio-group'
import { TextInput } from './text-input'

const attribute = (html: string, tag: string, name: string) =>
  new RegExp(`<${tag}[^>]*\\s${name}="([^"]*)"`).exec(html)?.[1]

describe('a field', () => {
  it('ties label, hint and error to its control', () => {
    const html = renderToStaticMarkup(
      <Field label="Depth" hint="Nominal inches" error="Depth must be 3 to 24 in" id="depth">
        {(control) => <TextInput {...control} />}
      </Field>,
    )
    expect(attribute(html, 'label', 'for')).toBe('depth')
    expect(attribute(html, 'input', 'id')).toBe('depth')
    expect(attribute(html, 'input', 'aria-invalid')).toBe('true')
    const described = attribute(html, 'input', 'aria-describedby')?.split(' ') ?? []
    expect(described).toHaveLength(2)
    const [hint, error] = described.map((id) => new RegExp(`id="${id}"[^>]*>([^<]*)<`).exec(html)?.[1])
    expect(hint).toBe('Nominal inches')
    expect(error).toBe('Depth must be 3 to 24 in')
  })

  it('says nothing of errors when there is none', () => {
    const html = renderToStaticMarkup(<Field label="Depth">{(control) => <TextInput {...control} />}</Field>)
    expect(html).not.toContain('aria-invalid=')
    expect(html).not.toContain('aria-describedby=')
  })

  it('reads the unit out with the number, and the hint after it', () => {
    const html = renderToStaticMarkup(
      <Field label="Diameter" hint="6 to 28" id="diameter">
        {(control) => <NumberInput {...control} unit="in" />}
      </Field>,
    )
    expect(attribute(html, 'input', 'aria-describedby')).toBe('diameter-unit diameter-hint')
    expect(html).toMatch(/id="diameter-unit"[^>]*>in</)
  })
})

it('a busy button says what is going on, keeps its place in the tab order and is announced', () => {
  const html = renderToStaticMarkup(<Button busy="Issuing revision 8">Issue revision 8</Button>)
  expect(html).toContain('Issuing revision 8…')
  expect(html).toContain('aria-busy="true"')
  expect(html).toContain('aria-disabled="true"')
  expect(html).not.toContain(' disabled=')
})

it('a choice of answers is a named group of radio buttons with one chosen', () => {
  const html = renderToStaticMarkup(
    <RadioGroup
      legend="Kick 22"
      name="answer"
      value="instead"
      onChange={() => undefined}
      options={[
        { value: 'as-asked', label: 'As asked' },
        { value: 'instead', label: 'Instead' },
      ]}
    />,
  )
  expect(html).toMatch(/<fieldset[^>]*><legend[^>]*>Kick 22<\/legend>/)
  expect(html.match(/type="radio"/g)).toHaveLength(2)
  expect(html.match(/checked=""/g)).toHaveLength(1)
  expect(html).toMatch(/checked=""[^>]*value="instead"|value="instead"[^>]*checked=""/)
})

it('a tick box is named by its label', () => {
  const html = renderToStaticMarkup(<Checkbox label="That is all from us" id="closed" />)
  expect(attribute(html, 'label', 'for')).toBe('closed')
  expect(attribute(html, 'input', 'id')).toBe('closed')
})

it('every kind of notice has a word of its own, and an error interrupts', () => {
  const words = (['info', 'wait', 'error', 'success'] as const).map((kind) => {
    const html = renderToStaticMarkup(<Notice kind={kind}>text</Notice>)
    expect(html.includes('role="alert"')).toBe(kind === 'error')
    return /<strong[^>]*>([^<]+)</.exec(html)?.[1]
  })
  expect(new Set(words).size).toBe(4)
})
