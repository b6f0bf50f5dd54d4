import { describe, expect, it } from 'vitest'
import { problemOf } from './reading'

const head = '# Hz S RI R 50\n'
const v2 = (lines: string, data = '1 0 0\n[End]\n') => `[Version] 2.0\n# Hz S RI R 50\n${lines}[Network Data]\n${data}`
const one = '[Number of Ports] 1\n'
const two = '[Number of Ports] 2\n'
const twoPort = '0 0 0 0 0 0 0 0'

/** By the standard where it says so; the words and the choice to refuse are common practice, no source. */
describe('what cannot be understood is refused by its line, with what to do', () => {
  it.each<[string, string, number | null, string, string?]>([
    ['NaN', `${head}1 0 nan\n`, 2, "'nan' is not a finite number; take this frequency out or measure it again."],
    [
      'infinity',
      `${head}1 0 0\n2 -Inf 0\n`,
      3,
      "'-Inf' is not a finite number; take this frequency out or measure it again.",
    ],
    [
      'a value past the largest double',
      `${head}1 0 1e309\n`,
      2,
      "'1e309' is not a finite number; see whether the file is a whole Touchstone file.",
    ],
    [
      'decimal commas',
      `${head}1 0,5 0\n`,
      2,
      "'0,5' is not a finite number; write a decimal point and put blanks between numbers.",
    ],
    [
      'commas between numbers',
      `${head}1, 0.5, 0\n`,
      2,
      "'1,' is not a finite number; write a decimal point and put blanks between numbers.",
    ],
    [
      'letters behind a number',
      `${head}1 0.5x 0\n`,
      2,
      "'0.5x' is not a finite number; see whether the file is a whole Touchstone file.",
    ],
    ['a negative frequency', `${head}-1 0 0\n`, 2, 'A frequency of -1 Hz is impossible.'],
    ['R of 0', '! one\n# GHz R 0\n1 0 0\n', 2, 'A reference of 0 Ω is impossible; it must be above zero.'],
    ['a negative R', '# R -50\n1 0 0\n', 1, 'A reference of -50 Ω is impossible; it must be above zero.'],
    ['an infinite R', '# R 1e999\n1 0 0\n', 1, 'A reference of Infinity Ω is impossible; it must be above zero.'],
    ['R without a number', '# GHz S R\n1 0 0\n', 1, 'R has no number; write the reference in ohms behind it.'],
    [
      'a complex R',
      '# GHz S RI R 50 + j10\n1 0 0\n',
      1,
      "'+' is no reference in ohms. Touchstone knows only real references: renormalise the data to one, such as 50, before saving.",
    ],
    [
      'another complex R',
      '# GHz S RI R (50+10j)\n1 0 0\n',
      1,
      "'(50+10j)' is no reference in ohms. Touchstone knows only real references: renormalise the data to one, such as 50, before saving.",
    ],
    [
      'R of a wrong number of ports',
      '# R 50 75\n1 0 0 0 0\n',
      1,
      'R has 2 numbers for 1 port; write one for all or one for each.',
    ],
    [
      'R of 17 ports',
      `# R${' 50'.repeat(17)}\n1 0 0\n`,
      1,
      'R has more than 16 numbers; write one for all ports or one for each.',
    ],
    [
      'references of 17 ports',
      v2(`${one}[Reference]${' 50'.repeat(17)}\n`),
      4,
      '[Reference] has more than 16 entries; write one for each port.',
    ],
    [
      'modes of 17 ports',
      v2(`${one}[Mixed-Mode Order]${' S1'.repeat(17)}\n`),
      4,
      '[Mixed-Mode Order] has more than 16 entries; write one for each port.',
    ],
    [
      'an unknown word among the options',
      '# GHz Q RI\n1 0 0\n',
      1,
      "'Q' is unknown in an option line; it has a unit (Hz, kHz, MHz, GHz), a parameter (S, Y, Z, H, G), a format (RI, MA, DB) and R with ohms.",
    ],
    [
      'an option twice',
      '# GHz S MHz\n1 0 0\n',
      1,
      'The option line gives the unit of frequency twice; leave out the one that is wrong.',
    ],
    [
      'H-parameters of one port',
      '# GHz H RI\n1 0 0\n',
      1,
      'H-parameters are for two single-ended ports only; save the data as S-parameters.',
    ],
    ['no data', head, null, 'The file has no data; save it again with at least one frequency.'],
    ['nothing', '', null, 'The file has no data; save it again with at least one frequency.'],
    [
      'a falling frequency',
      `${head}2 0 0\n1 0 0\n`,
      3,
      'The frequency falls from 2 Hz to 1 Hz; sort the rows, or give the file the ending that has its number of ports.',
    ],
    [
      'a falling frequency of two ports',
      `${head}2 ${twoPort}\n1 ${twoPort}\n`,
      3,
      'The frequency falls from 2 Hz to 1 Hz; sort the rows (noise data after them have five numbers a line).',
      'link.s2p',
    ],
    [
      'half a row',
      `${head}1 0 0\n2 0\n\n`,
      3,
      'The data end inside the row that begins here, with 2 of its 3 numbers; see whether the file is whole and the number of ports right.',
    ],
    [
      'half a noise row',
      `${head}2 ${twoPort}\n1 0 0 0 0\n2 0 0\n`,
      5,
      'The noise data end inside a row; each has five numbers. See whether the file is whole.',
      'link.s2p',
    ],
    [
      'four ports named as two',
      `${head}1 ${twoPort}\n ${twoPort}\n`,
      3,
      'The frequency falls from 1 Hz to 0 Hz; sort the rows (noise data after them have five numbers a line).',
      'link.s2p',
    ],
    [
      'no ending',
      `${head}1 0 0\n`,
      null,
      'The number of ports is unknown; give the file an ending such as .s2p or .s4p.',
      'link.txt',
    ],
    ['9999 ports', `${head}1 0 0\n`, null, 'By its ending the file has 9999 ports; 1 to 16 are read.', 'link.s9999p'],
    ['no ports', `${head}1 0 0\n`, null, 'By its ending the file has 0 ports; 1 to 16 are read.', 'link.s0p'],
    [
      'version 1 named .ts',
      `${head}1 0 0\n`,
      2,
      'A .ts file begins with [Version] 2.0; give one of version 1 an ending such as .s4p.',
      'link.ts',
    ],
    ['zero bytes', `${head}\u0000`, 2, 'The file is not text: it has a zero byte here.'],
    [
      'a picture',
      '\u0089PNG\r\n\u001a\n',
      1,
      "'Â\u0089PNG' is not a finite number; see whether the file is a whole Touchstone file.".replace('\u0089', '?'),
    ],
    [
      'a keyword without [Version]',
      `${head}[Number of Ports] 1\n`,
      2,
      '[Number of Ports] is a keyword of version 2; write [Version] 2.0 as the first line.',
    ],
    [
      'a keyword without its end',
      '[Version 2.0\n',
      1,
      'A keyword begins here and has no ] at its end; write it as, for example, [Network Data].',
    ],
    [
      'an unknown version',
      '[Version] 3.0\n',
      1,
      "[Version] is 2.0 or 2.1, not '3.0'; a file of version 1 has no such line.",
    ],
    ['two versions', '[Version] 2.0\n[Version] 2.0\n', 2, '[Version] stands here a second time; leave one out.'],
    ['version 2 without ports', v2(''), 3, 'The number of ports is missing; write [Number of Ports] before the data.'],
    [
      'version 2 without an option line',
      `[Version] 2.0\n${one}[Network Data]\n1 0 0\n`,
      3,
      'The option line is missing; write one, such as # GHz S MA R 50, before the data.',
    ],
    ['version 2 with 17 ports', v2('[Number of Ports] 17\n'), 3, 'The file has 17 ports; at most 16 are read.'],
    [
      'version 2 with a word for a number',
      v2('[Number of Ports] two\n'),
      3,
      "[Number of Ports] is 'two'; write a whole number above zero.",
    ],
    [
      'version 2 without a number',
      v2('[Number of Ports]\n'),
      3,
      '[Number of Ports] has nothing behind it; write its value on the same line.',
    ],
    [
      'two ports without their order',
      v2(two),
      4,
      'It is unknown whether S12 or S21 comes first; write [Two-Port Data Order] 12_21 or 21_12 before the data.',
    ],
    [
      'an unknown order',
      v2(`${two}[Two-Port Data Order] 11_22\n`),
      4,
      "[Two-Port Data Order] is '11_22'; write 12_21 or 21_12.",
    ],
    [
      'an unknown matrix format',
      v2(`${one}[Matrix Format] Diagonal\n`),
      4,
      "[Matrix Format] is 'Diagonal'; write full, lower or upper.",
    ],
    [
      'too few references',
      v2(`${two}[Two-Port Data Order] 12_21\n[Reference] 50\n`),
      6,
      '[Reference] has 1 numbers for 2 ports; write one for each.',
    ],
    ['a reference of 0', v2(`${one}[Reference]\n0\n`), 5, 'A reference of 0 Ω is impossible; it must be above zero.'],
    [
      'a file that is cut',
      v2(`${one}[Number of Frequencies] 3\n`),
      7,
      '[Number of Frequencies] is 3, but there are 1; see whether the file is whole.',
    ],
    [
      'data before [Network Data]',
      `[Version] 2.0\n${head}${one}1 0 0\n`,
      4,
      "'1' stands before [Network Data]; write that keyword before the data.",
    ],
    [
      'a keyword among the data',
      v2(one, '1 0 0\n[Reference] 50\n'),
      6,
      'Behind [Network Data] only [Noise Data] and [End] may stand.',
    ],
    [
      'noise of one port',
      v2(one, '1 0 0\n[Noise Data]\n'),
      6,
      '[Noise Data] may stand only once, behind the [Network Data] of two ports.',
    ],
    [
      'information without end',
      `[Version] 2.0\n[Begin Information]\n[Maker] any\n`,
      2,
      '[Begin Information] has no [End Information]; write it behind the last line of the information.',
    ],
    [
      'modes that are too few',
      v2(`${one}[Mixed-Mode Order] S1 S1\n`),
      5,
      '[Mixed-Mode Order] has 2 modes for 1 ports; write as many.',
    ],
    [
      'a difference without its sum',
      v2(`${two}[Two-Port Data Order] 12_21\n[Mixed-Mode Order] D1,2 S2\n`, `1 ${twoPort}\n`),
      2,
      '[Mixed-Mode Order] must have each port once: alone (S), or in one pair with its D and its C.',
    ],
    ['a mode of no port', v2(`${one}[Mixed-Mode Order] S2\n`), 2, "'S2' names a port that is not there; there are 1."],
    [
      'a mode that is none',
      v2(`${one}[Mixed-Mode Order] X1\n`),
      2,
      "'X1' is unknown in [Mixed-Mode Order]; write S4, D2,3 or C2,3.",
    ],
    [
      'a pair with two references',
      v2(`${two}[Reference] 50 75\n[Two-Port Data Order] 12_21\n[Mixed-Mode Order] D1,2 C1,2\n`, `1 ${twoPort}\n`),
      2,
      "'D1,2' needs two ports of the same reference.",
    ],
    [
      'an impedance of −R',
      '# Hz Z RI R 50\n1 0 0\n2 -1 0\n',
      3,
      'The values at 2 Hz have no S-parameters, or ones too large to compute; take this frequency out.',
    ],
    [
      'decibels past the largest double',
      '# Hz S DB R 50\n1 0 0\n2 9999 0\n',
      3,
      'The values at 2 Hz have no S-parameters, or ones too large to compute; take this frequency out.',
    ],
    [
      'an option line that is one word of 1,000 letters',
      `# ${'x'.repeat(1000)}\n1 0 0\n`,
      1,
      `'${'x'.repeat(24)}…' is longer than anything that may stand here.`,
    ],
    [
      'a number of 1,000 digits',
      `${head}1 0.${'1'.repeat(1000)} 0\n`,
      2,
      `'0.${'1'.repeat(22)}…' is not a finite number; see whether the file is a whole Touchstone file.`,
    ],
  ])('%s', (_, text, line, message, name) => {
    expect(problemOf(text, name)).toEqual({ line, message })
  })

  it('UTF-16', () => {
    const text = Uint8Array.from([0xff, 0xfe, 0x23, 0])
    expect(problemOf(text)).toEqual({
      line: 1,
      message: 'The file is in UTF-16; save it as plain text (ASCII or UTF-8).',
    })
  })

  it('lines are counted whatever ends them', () => {
    expect(problemOf('! a\r\n! b\r\r\n# Hz S RI R 50\n\n1 0 x')).toMatchObject({ line: 6 })
  })
})
