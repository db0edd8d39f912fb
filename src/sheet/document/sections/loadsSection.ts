import {
  builtInSpectrum,
  busName,
  connectionWords,
  elementsOfKind,
  fieldsOf,
  nameOf,
  type ShuntElement,
  type Study,
  withDefaults,
} from '../../../study/index.ts';
import { cells, NONE } from '../cells.ts';
import { fieldValue } from '../fieldValue.ts';
import { entered, significant } from '../formatNumber.ts';
import type { Block, Row, Section, TableBlock } from '../model.ts';
import type { SheetView } from '../SheetView.ts';

type LoadPart = Extract<ShuntElement, { kind: 'load' | 'motor' | 'converter' }>;

const optional = (value: number | undefined): string => (value === undefined ? NONE : entered(value));

function supplyTable(study: Study): TableBlock | undefined {
  const supplies = elementsOfKind(study, 'supply').map((part): Row => {
    const background = part.background ?? [];
    const rows = background.map(({ h, percent }) => `h${h} ${entered(percent)} %`).join(', ');
    return cells(
      nameOf(part),
      busName(study, part.bus),
      entered(part.shortCircuitMVA),
      optional(part.shortCircuitMVAMin),
      entered(part.xOverR),
      entered(part.setpointPercent ?? 100),
      rows === '' ? 'none entered' : rows,
    );
  });
  const generators = elementsOfKind(study, 'generator').map((part): Row => {
    const { xOverR, setpointPercent } = withDefaults(part, study);
    return cells(
      nameOf(part),
      busName(study, part.bus),
      significant((part.ratedKVA * 100) / part.xdSubtransientPercent / 1000, 4),
      NONE,
      entered(xOverR),
      entered(setpointPercent),
      `generator ${entered(part.ratedKVA)} kVA, x″d ${entered(part.xdSubtransientPercent)} %`,
    );
  });
  const rows = [...supplies, ...generators];
  if (rows.length === 0) return undefined;
  return {
    kind: 'table',
    columns: [
      { head: 'source', align: 'left', grow: 1 },
      { head: 'busbar', align: 'left', grow: 1 },
      { head: 'fault level, most', unit: 'MVA', align: 'decimal' },
      { head: 'fault level, least', unit: 'MVA', align: 'decimal' },
      { head: 'X/R', align: 'decimal' },
      { head: 'voltage', unit: '% of U_n', align: 'decimal' },
      { head: 'background distortion', unit: '% of U_n by order', align: 'left', grow: 3 },
    ],
    rows,
    notes: rows.some((row) => row.kind === 'cells' && row.cells.some(({ text }) => text === NONE))
      ? [`${NONE} not given.`]
      : [],
  };
}

function demandOf(part: LoadPart): string {
  if (part.kind !== 'motor') return entered(part.kW);
  return `${part.count === undefined || part.count === 1 ? '' : `${part.count} × `}${entered(part.ratedKW)}`;
}

function spectrumOf(study: Study, part: LoadPart): string {
  if (part.kind !== 'converter') return NONE;
  const field = fieldsOf('converter').find(({ key }) => key === 'spectrum');
  if (typeof part.spectrum !== 'string')
    return field ? (fieldValue(study, field, part.spectrum) ?? NONE) : NONE;
  const own = study.spectra?.find(({ id }) => id === part.spectrum);
  if (own) return [nameOf(own), own.origin].filter(Boolean).join('; ');
  const known = builtInSpectrum(part.spectrum);
  return known ? `${known.name} (${known.provenance})` : part.spectrum;
}

function loadRow(study: Study, part: LoadPart): Row {
  const powerFactor = part.kind === 'motor' ? withDefaults(part, study).powerFactor : part.powerFactor;
  const leading = part.kind !== 'motor' && part.leading === true;
  const connection = part.kind === 'motor' ? 'L1L2L3' : (part.connection ?? 'L1L2L3');
  const kind =
    part.kind === 'motor' ? `motor, ${entered(withDefaults(part, study).loadPercent)} % loaded` : part.kind;
  return cells(
    nameOf(part),
    busName(study, part.bus),
    kind,
    demandOf(part),
    entered(powerFactor),
    leading ? 'leading' : 'lagging',
    connectionWords(study, connection),
    spectrumOf(study, part),
  );
}

/** Sources with their fault levels, and what draws power, as entered in the base study. */
export function loadsSection(view: SheetView): Section {
  const { study } = view;
  const supply = supplyTable(study);
  const parts = study.elements.filter(
    (element): element is LoadPart =>
      element.kind === 'load' || element.kind === 'motor' || element.kind === 'converter',
  );
  const loads: TableBlock = {
    kind: 'table',
    columns: [
      { head: 'load', align: 'left', grow: 1 },
      { head: 'busbar', align: 'left', grow: 1 },
      { head: 'kind', align: 'left', grow: 1 },
      { head: 'demand or shaft rating', unit: 'kW', align: 'right' },
      { head: 'cos φ', align: 'decimal' },
      { head: 'sense', align: 'left' },
      { head: 'phases', align: 'left' },
      { head: 'harmonic currents', align: 'left', grow: 2 },
    ],
    rows: parts.map((part) => loadRow(study, part)),
    notes: [],
  };
  const blocks: Block[] = [];
  if (supply) blocks.push(supply);
  else blocks.push({ kind: 'paragraph', text: 'The study has no source.' });
  if (parts.length > 0) blocks.push(loads);
  else blocks.push({ kind: 'paragraph', text: 'The study has no load, motor or converter.' });
  return { id: 'loads', title: 'Supply and loads', blocks };
}
