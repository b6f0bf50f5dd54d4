import { overlap, part, publishedBy } from './published'
import { CURVE_FROM_MEMORY, NO_CLAUSE_SEEN } from './words'

const LANE = { bitRate: '53.125 Gb/s', code: 'PAM4', nyquist: '13.28125 GHz', at: '13.28125 GHz' } as const

/** IEEE 802.3, lanes of 53.125 Gb/s. */
export const ieee50g = publishedBy('IEEE 802.3', {
  'ieee-50g-kr': {
    ...LANE,
    name: '50GBASE-KR, 100GBASE-KR2, 200GBASE-KR4',
    clause: '802.3cd Clause 137',
    limit: '30 dB',
    publishedFrom: 'tp0',
    publishedTo: 'tp5',
    presumes: 'Connectors between the planes included; the packages lie outside.',
    confidence: 'read',
    status: 'recommended; COM is the requirement',
    caution: NO_CLAUSE_SEEN,
  },
  'ieee-50g-cr': {
    ...LANE,
    name: '50GBASE-CR, 100GBASE-CR2, 200GBASE-CR4 channel',
    clause: '802.3cd Clause 136, Annex 136A',
    limit: '30 dB',
    publishedFrom: 'tp0',
    publishedTo: 'tp5',
    presumes: 'Connectors between the planes included; the packages lie outside.',
    confidence: 'from-memory',
    status: 'recommended for the channel; normative for the cable',
    split: [
      part('Cable assembly, TP1 to TP4', '17.16 dB'),
      part('Host of the transmitter, TP0 to TP2', '10.07 dB'),
      part('Host of the receiver, TP3 to TP5', '10.07 dB'),
      overlap("Mated fixture at the transmitter's end", '3.65 dB'),
      overlap("Mated fixture at the receiver's end", '3.65 dB'),
    ],
    caution: 'Hosts and cable both contain the mated fixtures, which are therefore subtracted once at each end.',
  },
  'ieee-50gaui-c2c': {
    ...LANE,
    name: '200GAUI-4, 400GAUI-8, 50GAUI-1 chip to chip',
    clause: '802.3bs Annex 120D, 802.3cd Annex 135F',
    limit: '20 dB',
    publishedFrom: 'tp0',
    publishedTo: 'tp5',
    presumes: 'At most one connector between the planes; the packages lie outside.',
    confidence: 'from-memory',
    status: 'recommended; COM applies',
  },
  'ieee-50gaui-c2m': {
    ...LANE,
    name: '200GAUI-4, 400GAUI-8, 50GAUI-1 chip to module',
    clause: '802.3bs Annex 120E (equation 120E-1), 802.3cd Annex 135G',
    limit: '10.2 dB',
    publishedFrom: 'tx-ball',
    publishedTo: 'module-ball',
    eitherWay: true,
    curve: '0.01..14 GHz: 0.0807 + 0.577812 sqrt(f) + 0.609016 f',
    presumes: 'One mated pair of connectors between the planes.',
    confidence: 'from-memory',
    status: 'budget, characterised by the equation',
    split: [part('Host', '7.5 dB'), part('Connector', '1.2 dB'), part('Module', '1.5 dB')],
    caution: `${CURVE_FROM_MEMORY} It gives 10.27 dB at this frequency, and it was being changed in 2017: check the clause.`,
  },
})
