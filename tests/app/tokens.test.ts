import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'

/**
 * Outside source: WCAG 2.2 (W3C Recommendation, 2024), 'relative luminance' and 'contrast ratio' definitions; success criteria
 * 1.4.3 (text, 4.5:1) and 1.4.11 (graphics and parts of controls, 3:1).
 */
const css = readFileSync(new URL('../../app/tokens.css', import.meta.url), 'utf8')
const themes = { light: new Map<string, string>(), dark: new Map<string, string>() }
for (const [, name = '', light = '', dark = ''] of css.matchAll(
  /--([\w-]+):\s*light-dark\((#[0-9a-f]{6}),\s*(#[0-9a-f]{6})\)/g,
)) {
  themes.light.set(name, light)
  themes.dark.set(name, dark)
}

function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const channel = Number.parseInt(hex.slice(at, at + 2), 16) / 255
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4
  })
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

function contrast(a: string, b: string): number {
  const [dark = 0, light = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y)
  return (light + 0.05) / (dark + 0.05)
}

const SKIES = ['sky', 'sheet', 'well']
const VERDICTS = ['inside', 'tight', 'over', 'undecided']
const DISCIPLINES = [...themes.light.keys()].filter((name) => name.startsWith('d-'))
const PEOPLE = [...themes.light.keys()].filter((name) => /^p-\d$/.test(name))
const each = (names: readonly string[], grounds: readonly string[]) =>
  names.flatMap((name) => grounds.map((ground) => [name, ground] as const))

/** What is read as text, on what it stands in the drawings and pages. */
const TEXT = [
  ...each(['ink', 'ink-2', 'ink-3', 'action', 'unsaved', ...VERDICTS], SKIES),
  ...each(['ink', 'ink-2', 'signal', 'action', ...VERDICTS], ['select', 'band-2']),
  ...VERDICTS.map((verdict) => [verdict, `${verdict}-bg`] as const),
  ...each(['ink'], ['tight-bg', 'over-bg', 'undecided-bg', 'inside-bg']),
  ...each(['signal', 'corner', ...PEOPLE], SKIES),
  ...each(['ink', 'ground-ink'], ['ground']),
  ...each(['on-action'], ['action']),
  ...each(['on-p'], PEOPLE),
]

/** What is seen as a mark. */
const MARKS = [
  ...each(['rule-2', 'focus', ...DISCIPLINES], SKIES),
  ...each(['signal', 'corner', 'focus'], ['band', 'band-2', 'ground', 'select']),
  ...each(['ground-ink'], ['sheet', 'ground']),
  ...each([...VERDICTS], ['ground']),
]

describe.each(Object.entries(themes))('contrast in the %s theme', (_theme, values) => {
  const value = (name: string) => {
    const hex = values.get(name)
    if (!hex) throw new Error(`tokens.css has no colour --${name}`)
    return hex
  }

  it.each(TEXT)('text --%s on --%s: at least 4.5', (name, ground) => {
    expect(contrast(value(name), value(ground))).toBeGreaterThanOrEqual(4.5)
  })

  it.each(MARKS)('mark --%s on --%s: at least 3', (name, ground) => {
    expect(contrast(value(name), value(ground))).toBeGreaterThanOrEqual(3)
  })
})

describe('the tokens', () => {
  it('give every colour for both themes', () => {
    expect(themes.light.size).toBeGreaterThan(40)
    expect(css.match(/#[0-9a-f]{3,8}/gi)).toHaveLength(2 * themes.light.size)
  })

  it('contrast agrees with the ends of the scale in WCAG 2.2: 21 for black on white, 1 for equals', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10)
    expect(contrast('#777777', '#777777')).toBe(1)
  })
})
