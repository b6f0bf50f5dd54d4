/**
 * The units a person may type, by dimension, each with its factor to the SI unit used inside.
 * Factors are exact: the international inch is 0.0254 m (NIST SP 811, appendix B.8).
 */
export const DIMENSIONS = {
  length: { si: 'm', units: { m: 1, cm: 1e-2, mm: 1e-3, µm: 1e-6, in: 0.0254, mil: 0.0254e-3, ft: 0.3048 } },
  frequency: { si: 'Hz', units: { Hz: 1, kHz: 1e3, MHz: 1e6, GHz: 1e9 } },
  bitRate: {
    si: 'b/s',
    units: { 'b/s': 1, 'kb/s': 1e3, 'Mb/s': 1e6, 'Gb/s': 1e9, 'Tb/s': 1e12, 'MT/s': 1e6, 'GT/s': 1e9 },
  },
  symbolRate: { si: 'Bd', units: { Bd: 1, kBd: 1e3, MBd: 1e6, GBd: 1e9 } },
  time: { si: 's', units: { s: 1, ms: 1e-3, µs: 1e-6, ns: 1e-9, ps: 1e-12, fs: 1e-15 } },
  loss: { si: 'dB', units: { dB: 1 } },
  lossPerLength: {
    si: 'dB/m',
    units: { 'dB/m': 1, 'dB/cm': 100, 'dB/mm': 1000, 'dB/in': 1 / 0.0254, 'dB/ft': 1 / 0.3048 },
  },
  delayPerLength: {
    si: 's/m',
    units: { 'ps/in': 1e-12 / 0.0254, 'ps/mm': 1e-9, 'ps/m': 1e-12, 'ns/m': 1e-9, 'ns/ft': 1e-9 / 0.3048 },
  },
  capacitance: { si: 'F', units: { F: 1, µF: 1e-6, nF: 1e-9, pF: 1e-12, fF: 1e-15 } },
  inductance: { si: 'H', units: { H: 1, µH: 1e-6, nH: 1e-9, pH: 1e-12 } },
  resistance: { si: 'Ω', units: { Ω: 1, mΩ: 1e-3, kΩ: 1e3 } },
  /** Celsius is kept inside as Celsius: every use of it is a difference or a coefficient. */
  temperature: { si: '°C', units: { '°C': 1 } },
  ratio: { si: '1', units: { '%': 1e-2 } },
  perKelvin: { si: '1/K', units: { '%/K': 1e-2, '%/°C': 1e-2, 'ppm/K': 1e-6 } },
  number: { si: '1', units: { '': 1 } },
} as const satisfies Record<string, { si: string; units: Record<string, number> }>

export type Dimension = keyof typeof DIMENSIONS

/**
 * Other spellings of the units above, as found in mail and data sheets. Around a solidus each side may be spelled so.
 * Text is brought to Unicode's composed form first, which turns the ohm sign into Ω, and μ (Greek) into µ (micro).
 */
export const SPELLINGS: Readonly<Record<string, string>> = {
  um: 'µm',
  inch: 'in',
  inches: 'in',
  '"': 'in',
  '″': 'in',
  '”': 'in',
  mils: 'mil',
  thou: 'mil',
  foot: 'ft',
  feet: 'ft',
  ohm: 'Ω',
  ohms: 'Ω',
  mohm: 'mΩ',
  kohm: 'kΩ',
  C: '°C',
  degC: '°C',
  'deg C': '°C',
  '° C': '°C',
  ºC: '°C',
  '℃': '°C',
  uF: 'µF',
  uH: 'µH',
  us: 'µs',
  sec: 's',
  bps: 'b/s',
  kbps: 'kb/s',
  Mbps: 'Mb/s',
  Gbps: 'Gb/s',
  Tbps: 'Tb/s',
  'bit/s': 'b/s',
  'kbit/s': 'kb/s',
  'Mbit/s': 'Mb/s',
  'Gbit/s': 'Gb/s',
  'Tbit/s': 'Tb/s',
  'dB/inch': 'dB/in',
  baud: 'Bd',
  MBaud: 'MBd',
  Mbaud: 'MBd',
  'Msym/s': 'MBd',
  GBaud: 'GBd',
  Gbaud: 'GBd',
  'Gsym/s': 'GBd',
  percent: '%',
}
