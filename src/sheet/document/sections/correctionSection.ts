import {
  type Bank,
  busById,
  busName,
  type Filter,
  nameOf,
  type Study,
  withDefaults,
} from '../../../study/index.ts';
import { cells, NONE } from '../cells.ts';
import { correctionOf, ratedKvar, stepsInWords } from '../correctionParts.ts';
import { entered, fixed, significant } from '../formatNumber.ts';
import type { Block, Row, Section, TableBlock } from '../model.ts';
import type { SheetView } from '../SheetView.ts';

const CONNECTIONS = { delta: 'delta', star: 'star', 'star-earthed': 'star, earthed' } as const;

/** Microfarads of each of the three capacitors: Q/(3ωU²) in delta, Q/(ωU²) in star. */
function microfarads(kvar: number, ratedV: number, hertz: number, delta: boolean): number {
  return (kvar * 1e9) / (2 * Math.PI * hertz * ratedV ** 2 * (delta ? 3 : 1));
}

/** Millihenries of each phase: p·U²/(Q·ω), star-equivalent, in the line. */
function reactorMH(kvar: number, ratedV: number, hertz: number, percent: number): number {
  return ((percent / 100) * ratedV ** 2) / (2 * Math.PI * hertz * kvar);
}

function bankRow(study: Study, part: Bank): Row {
  const full = withDefaults(part, study);
  const kvar = ratedKvar(part);
  const { ratedV, detuningPercent: p } = full;
  return cells(
    nameOf(part),
    busName(study, part.bus),
    part.steps.length > 1 ? stepsInWords(part.steps) : entered(kvar),
    entered(kvar),
    entered(ratedV),
    significant((kvar * 1000) / (Math.sqrt(3) * ratedV), 4),
    CONNECTIONS[full.connection],
    significant(microfarads(kvar, ratedV, study.frequencyHz, full.connection === 'delta'), 4),
    p === 0 ? 'plain' : entered(p),
    p === 0 ? NONE : fixed(10 / Math.sqrt(p), 2),
    p === 0 ? NONE : significant(reactorMH(kvar, ratedV, study.frequencyHz, p), 4),
    full.tolerancePercent.map((bound) => (bound > 0 ? `+${entered(bound)}` : entered(bound))).join(' … '),
  );
}

function bankTable(study: Study, banks: Bank[]): TableBlock {
  return {
    kind: 'table',
    columns: [
      { head: 'bank', align: 'left', grow: 1 },
      { head: 'busbar', align: 'left', grow: 1 },
      { head: 'steps', unit: 'kvar', align: 'left', grow: 1 },
      { head: 'rated', unit: 'kvar', align: 'decimal' },
      { head: 'at rated voltage', unit: 'V', align: 'right' },
      { head: 'rated current', unit: 'A', align: 'decimal' },
      { head: 'connection', align: 'left' },
      { head: 'C a phase', unit: 'µF', align: 'decimal' },
      { head: 'detuning p', unit: '%', align: 'right' },
      { head: 'tuned order', align: 'decimal' },
      { head: 'reactor a phase', unit: 'mH', align: 'decimal' },
      { head: 'tolerance of C', unit: '%', align: 'right' },
    ],
    rows: banks.map((bank) => bankRow(study, bank)),
    notes: [
      'Whole bank with every step in. C a phase: each of three capacitors in the stated connection; reactor a phase: in the line. Rated current I_N = Q_N/(√3·U_N).',
    ],
  };
}

function filterRow(study: Study, part: Filter): Row {
  const full = withDefaults(part, study);
  const nominalV = busById(study, part.bus)?.nominalV;
  const n2 = part.tunedOrder ** 2;
  const xl = nominalV === undefined ? undefined : nominalV ** 2 / (part.kvar * 1000) / (n2 - 1);
  const henry = xl === undefined ? NONE : significant((xl * 1000) / (2 * Math.PI * study.frequencyHz), 4);
  return cells(
    nameOf(part),
    busName(study, part.bus),
    part.type,
    entered(part.kvar),
    entered(part.ratedV),
    CONNECTIONS[full.connection],
    entered(part.tunedOrder),
    entered(part.qFactor),
    henry,
  );
}

function filterTable(study: Study, filters: Filter[]): TableBlock {
  return {
    kind: 'table',
    columns: [
      { head: 'filter', align: 'left', grow: 1 },
      { head: 'busbar', align: 'left', grow: 1 },
      { head: 'type', align: 'left', grow: 1 },
      { head: 'net, at nominal voltage', unit: 'kvar', align: 'decimal' },
      { head: 'rated voltage', unit: 'V', align: 'right' },
      { head: 'connection', align: 'left' },
      { head: 'tuned order', align: 'decimal' },
      { head: 'quality q', align: 'decimal' },
      { head: 'reactor a phase', unit: 'mH', align: 'decimal' },
    ],
    rows: filters.map((filter) => filterRow(study, filter)),
    notes: [],
  };
}

/** Banks and filters with the ratings to order by. */
export function correctionSection(view: SheetView): Section {
  const parts = correctionOf(view.study).map(({ part }) => part);
  const banks = parts.filter((part): part is Bank => part.kind === 'bank');
  const filters = parts.filter((part): part is Filter => part.kind === 'filter');
  const blocks: Block[] = [];
  if (banks.length > 0) blocks.push(bankTable(view.study, banks));
  if (filters.length > 0) blocks.push(filterTable(view.study, filters));
  if (parts.length === 0) blocks.push({ kind: 'paragraph', text: 'The study holds no bank and no filter.' });
  return { id: 'correction', title: 'Correction proposed: parts and ratings', blocks };
}
