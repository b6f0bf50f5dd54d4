import { z } from 'zod'
import { choice, integer, quantity, text } from './scalars'
import { CODES } from './words'

export const SCHEMA_VERSION = 1

/** What is said once for the whole budget: the link and its signalling. One budget, one differential reference impedance. */
export const head = z.strictObject({
  schemaVersion: z.literal(SCHEMA_VERSION),
  name: text(120, 'Name of the budget.'),
  description: text(400, 'The link in a few words.'),
  protocol: text(120, 'Protocol or rate class, in words.'),
  bitRate: quantity('bitRate', { min: 1e6, max: 2e12, unit: 'Gb/s' }, 'Bit rate of one lane, as the rate type says.'),
  rateType: choice(['line', 'payload'], "'line': with coding and FEC overhead, as sent; 'payload': before them."),
  code: choice(CODES, 'Line code.'),
  codedBits: integer(1, 64, 'Coded PAM: bits carried by one group of symbols (11 in 11 bits per 7 symbols).'),
  codedSymbols: integer(1, 64, 'Coded PAM: symbols in one group (7 in 11 bits per 7 symbols).'),
  codingBits: integer(1, 4096, 'Block code: payload bits (256 in 256b/257b).'),
  codingLineBits: integer(1, 4096, 'Block code: bits sent (257 in 256b/257b).'),
  fecMessage: integer(1, 65535, 'FEC: message symbols (514 in RS(544,514)).'),
  fecCodeword: integer(1, 65535, 'FEC: code word symbols (544 in RS(544,514)).'),
  edgeTime: quantity('time', { min: 1e-13, max: 1e-8, unit: 'ps' }, 'Edge of the transmitter from 20 % to 80 %.'),
  reference: quantity(
    'resistance',
    { min: 10, max: 200 },
    'Differential reference impedance of every two-port in this budget.',
  ),
  laneCount: integer(1, 256, 'Lanes of the link.'),
  seed: integer(1, 2147483647, 'Seed of the random builds, so that they can be drawn again; empty: 1.'),
  referenceTemperature: quantity('temperature', { min: -60, max: 200 }, 'Temperature of the reference corner.'),
})
