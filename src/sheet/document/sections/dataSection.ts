import {
  busById,
  busesOf,
  busName,
  type DataOrigin,
  defaultOf,
  type Field,
  fieldsOf,
  homeBusOf,
  kindWords,
  nameOf,
  type Study,
  type StudyElement,
} from '../../../study/index.ts';
import { cell, cells } from '../cells.ts';
import { fieldValue } from '../fieldValue.ts';
import type { Block, Cell, Row, Section } from '../model.ts';
import type { SheetView } from '../SheetView.ts';

interface Datum {
  label: string;
  value: string;
  origin: string;
}

/** Keys the group row of a part already says. */
const SAID = new Set(['name', 'from', 'to', 'bus']);

function originWords(origin: DataOrigin): string {
  const details = [origin.date, origin.note].filter((item): item is string => Boolean(item));
  return details.length === 0 ? origin.origin : `${origin.origin} (${details.join(', ')})`;
}

/** The origin recorded for a field, or else for its whole owner. */
function originOf(study: Study, paths: readonly string[], key: string): string | undefined {
  const origins = study.origins ?? {};
  for (const path of [...paths.map((owner) => `${owner}.${key}`), ...paths]) {
    const found = origins[path];
    if (found) return originWords(found);
  }
  return undefined;
}

interface Owner {
  record: Readonly<Record<string, unknown>>;
  fields: readonly Field[];
  paths: readonly string[];
  nominalV?: number | undefined;
}

function dataOf(study: Study, owner: Owner): Datum[] {
  return owner.fields.flatMap((field): Datum[] => {
    if (SAID.has(field.key)) return [];
    const given = owner.record[field.key];
    const assumed = defaultOf(field, { owner: owner.record, nominalV: owner.nominalV });
    const value = fieldValue(study, field, given ?? assumed);
    if (value === undefined) return [];
    if (given === undefined && (field.key === 'on' || field.type === 'rows')) return [];
    const recorded = originOf(study, owner.paths, field.key);
    const origin = given === undefined ? 'default, assumed' : (recorded ?? 'not stated');
    return [{ label: field.label, value, origin: recorded && given === undefined ? recorded : origin }];
  });
}

/** Two data side by side to a row. */
function rowsOf(data: readonly Datum[]): Row[] {
  const half = Math.ceil(data.length / 2);
  const trio = (datum: Datum | undefined): (Cell | string)[] =>
    datum ? [datum.label, datum.value, cell('', datum.origin)] : ['', '', ''];
  return Array.from({ length: half }, (_, k) => cells(...trio(data[k]), ...trio(data[half + k])));
}

function elementRows(study: Study, element: StudyElement, index: number): Row[] {
  const data = dataOf(study, {
    record: { ...element },
    fields: fieldsOf(element.kind),
    paths: [`$.elements[${index}]`, `elements[${index}]`, `elements.${element.id}`, element.id],
    nominalV: busById(study, homeBusOf(element))?.nominalV,
  });
  const where = busesOf(element)
    .map((bus) => busName(study, bus))
    .join(' → ');
  const group: Row = { kind: 'group', text: nameOf(element), aside: `${kindWords[element.kind]}, ${where}` };
  return [group, ...rowsOf(data)];
}

function generalRows(study: Study): Row[] {
  const record = { ...study.criteria };
  const criteria = dataOf(study, { record, fields: fieldsOf('criteria'), paths: ['$.criteria', 'criteria'] });
  const system: Datum[] = [
    { label: 'nominal frequency', value: `${study.frequencyHz} Hz`, origin: 'entered' },
    {
      label: 'orders solved',
      value: `1 to ${study.maxOrder ?? 50}`,
      origin: study.maxOrder === undefined ? 'default, assumed' : 'entered',
    },
    {
      label: 'summation of harmonics',
      value: study.summation === 'alpha' ? 'IEC 61000-3-6 law' : 'phasors, all sources together',
      origin: study.summation === undefined ? 'default, assumed' : 'entered',
    },
  ];
  return [{ kind: 'group', text: 'System and criteria' }, ...rowsOf([...system, ...criteria])];
}

function busRows(study: Study): Row[] {
  const data = study.buses.map((bus, index): Datum => {
    const pcc = bus.pcc ? ', point of common coupling' : '';
    const withstand = bus.withstandKA === undefined ? '' : `, I_cw ${bus.withstandKA} kA`;
    const paths = [`$.buses[${index}]`, `buses[${index}]`, `buses.${bus.id}`, bus.id];
    return {
      label: nameOf(bus),
      value: `${fieldValue(study, nominalField(), bus.nominalV) ?? ''}${pcc}${withstand}`,
      origin: originOf(study, paths, 'nominalV') ?? 'not stated',
    };
  });
  return [{ kind: 'group', text: 'Busbars', aside: 'nominal voltage line to line' }, ...rowsOf(data)];
}

function nominalField(): Field {
  const field = fieldsOf('bus').find(({ key }) => key === 'nominalV');
  if (!field) throw new RangeError('the field catalogue has no nominalV for a busbar');
  return field;
}

const columns = (): Extract<Block, { kind: 'table' }>['columns'] => [
  { head: 'quantity', align: 'left', grow: 1 },
  { head: 'value', align: 'left', grow: 1 },
  { head: 'origin', align: 'left', grow: 1 },
  { head: 'quantity', align: 'left', grow: 1 },
  { head: 'value', align: 'left', grow: 1 },
  { head: 'origin', align: 'left', grow: 1 },
];

/** Every datum of the base study with its origin; a default that was used is an assumption. */
export function dataSection(view: SheetView): Section {
  const { study } = view;
  const rows = [
    ...generalRows(study),
    ...busRows(study),
    ...study.elements.flatMap((element, index) => elementRows(study, element, index)),
  ];
  const blocks: Block[] = [
    {
      kind: 'paragraph',
      leadsOn: true,
      text: 'Values of the base study; what a case changes stands under “Operating cases”. “Default, assumed”: no value was entered, and the default stands in for it until checked against the nameplate. “Not stated”: entered without an origin.',
    },
    { kind: 'table', columns: columns(), rows, notes: [] },
  ];
  if (study.notes?.trim()) {
    blocks.push({ kind: 'heading', text: 'Remarks of the originator' });
    for (const text of study.notes.trim().split(/\n+/)) blocks.push({ kind: 'paragraph', text });
  }
  return { id: 'data', title: 'Assumptions and data', blocks };
}
