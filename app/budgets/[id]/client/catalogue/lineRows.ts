import { FOIL_CLASSES, type FoilClass } from '../../../../../lib/budget/catalogues/foils'
import type { LaminateEntry } from '../../../../../lib/budget/catalogues/laminates'
import type { PackageEntry } from '../../../../../lib/budget/catalogues/packages'
import { BASIS_WORD } from '../../../../words/terms'
import { wordOf } from '../words/choices'
import { type CatalogueRow, said } from './row'

type Own = CatalogueRow<unknown>['own']

export function laminateRow(id: string, entry: LaminateEntry, own: Own): CatalogueRow<LaminateEntry> {
  const { name, dk, df, anchor, dkFrom, dkTo, dfFrom, dfTo, basis, tolerance, confidence, caution } = entry
  return {
    ...{ id, entry, own, caution },
    title: name ?? 'Laminate without a name',
    figure: said([dk && `Dk ${dk}`, df && `Df ${df}`, anchor && `at ${anchor}`]).join(' '),
    facts: said([
      dkFrom && dkTo && `Dk ${dkFrom} to ${dkTo}`,
      dfFrom && dfTo && `Df ${dfFrom} to ${dfTo}`,
      said([basis && BASIS_WORD[basis], tolerance && `±${tolerance}`]).join(', '),
      confidence && wordOf(confidence),
    ]),
    fits: false,
  }
}

export function packageRow(id: string, entry: PackageEntry, own: Own): CatalogueRow<PackageEntry> {
  const { name, impedance, length, secondLength, secondImpedance, padCapacitance, dieCapacitance } = entry
  return {
    ...{ id, entry, own, caution: entry.caution },
    title: name ?? 'Package without a name',
    figure: said([length, impedance && `of ${impedance}`]).join(' '),
    facts: said([
      secondLength && secondImpedance && `then ${secondLength} of ${secondImpedance}`,
      padCapacitance && `ball ${padCapacitance}`,
      dieCapacitance && `die pad ${dieCapacitance}, a line of its own`,
      said([entry.body, entry.clause]).join(', '),
      entry.confidence && wordOf(entry.confidence),
    ]),
    fits: false,
  }
}

export const FOIL_ROWS: readonly CatalogueRow<FoilClass>[] = FOIL_CLASSES.map((foil) => ({
  id: foil.id,
  entry: foil,
  own: null,
  title: foil.name,
  figure: `Rz ${foil.rz}`,
  facts: [`Rz ${foil.rzFrom} to ${foil.rzTo}`, wordOf(foil.confidence)],
  caution: foil.caution,
  fits: false,
}))
