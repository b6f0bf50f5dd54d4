import { part, publishedBy } from './published'

const SILICON = { publishedFrom: 'tx-die', publishedTo: 'rx-die', status: 'budget' } as const
const GEN1 = { bitRate: '5 Gb/s', code: 'NRZ', nyquist: '2.5 GHz', at: '2.5 GHz' } as const
const AT_10G = { bitRate: '10 Gb/s', code: 'NRZ', nyquist: '5 GHz', at: '5 GHz' } as const
const CONNECTORS = 'Connectors between the planes included.'
const IN_CABLE = 'The connectors belong to the share of the cable.'
const READ_AS_DIE = "'Silicon' is read as the die, so that the packages are included: check it."

const shares = (host: string, cable: string, device: string) => [
  part('Host', host),
  part('Cable assembly', cable),
  part('Device', device),
]

/** USB-IF. */
export const usb = publishedBy('USB-IF', {
  'usb-gen1-legacy': {
    ...SILICON,
    ...GEN1,
    name: 'USB 3.x Gen 1, standard connectors',
    clause: 'USB 3.1 Channel Loss Budgets Rev 1.0',
    limit: '20 dB',
    presumes: IN_CABLE,
    confidence: 'two-sources',
    split: shares('10 dB', '7.5 dB', '2.5 dB'),
    caution: READ_AS_DIE,
  },
  'usb-gen1-microb': {
    ...SILICON,
    ...GEN1,
    name: 'USB 3.x Gen 1, micro-B, cable up to 1 m',
    clause: 'USB 3.1 Channel Loss Budgets Rev 1.0',
    limit: '20 dB',
    presumes: IN_CABLE,
    confidence: 'read',
    split: shares('10 dB', '3.5 dB', '6.5 dB'),
    caution: `The text read gives the device 6 to 7 dB; 6.5 dB is what closes the sum. ${READ_AS_DIE}`,
  },
  'usb-gen1-typec': {
    ...SILICON,
    ...GEN1,
    name: 'USB 3.x Gen 1, Type-C',
    clause: 'USB Type-C specification, loss budgets',
    limit: '20 dB',
    presumes: CONNECTORS,
    confidence: 'from-memory',
    split: shares('6.5 dB', '7 dB', '6.5 dB'),
    caution: READ_AS_DIE,
  },
  'usb-gen2': {
    ...SILICON,
    ...AT_10G,
    name: 'USB 3.x Gen 2, 10 Gb/s',
    clause: 'USB 3.1, 3.2; loss budgets',
    limit: '23 dB',
    presumes: IN_CABLE,
    confidence: 'read',
    split: shares('8.5 dB', '6 dB', '8.5 dB'),
    caution: READ_AS_DIE,
  },
  'usb4-gen2': {
    ...SILICON,
    ...AT_10G,
    name: 'USB4 Gen 2, passive cable',
    clause: 'USB4 version 1, USB Type-C 2.x',
    limit: '23 dB',
    presumes: CONNECTORS,
    confidence: 'from-memory',
    split: shares('5.5 dB', '12 dB', '5.5 dB'),
    caution: READ_AS_DIE,
  },
  'usb4-gen3': {
    ...SILICON,
    name: 'USB4 Gen 3, passive cable',
    clause: 'USB4 version 1, USB Type-C 2.x',
    bitRate: '20 Gb/s',
    code: 'NRZ',
    nyquist: '10 GHz',
    limit: '22.5 dB',
    at: '10 GHz',
    presumes: CONNECTORS,
    confidence: 'from-memory',
    split: shares('7.5 dB', '7.5 dB', '7.5 dB'),
    caution: `The text read says about 23 dB; 22.5 dB and the shares are from memory. ${READ_AS_DIE}`,
  },
  'usb4-gen4': {
    ...SILICON,
    name: 'USB4 Gen 4',
    clause: 'USB4 version 2',
    bitRate: '40.2285714286 Gb/s',
    code: 'PAM3',
    codedBits: 11,
    codedSymbols: 7,
    nyquist: '12.8 GHz',
    limit: '28 dB',
    at: '12.8 GHz',
    presumes: CONNECTORS,
    confidence: 'read',
    status: 'total, approximate',
    caution: `Called 40 Gb/s: 11 bits in 7 symbols at 25.6 GBd. ${READ_AS_DIE}`,
  },
})
