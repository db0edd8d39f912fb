import { kindWords, shortKindWords } from '../names.ts';
import { unitOf } from '../units/unitTable.ts';
import { type TableColumn, type TableOwner, tableColumns } from './tableColumns.ts';

/** A head as it was read: the column it names, and the unit it gives. */
export interface ReadHead {
  key: string | null;
  unit: string;
}

/** Other words heads of the trade's lists use, by field. */
const otherWords: Readonly<Record<string, readonly string[]>> = {
  name: ['name', 'part', 'designation', 'tag', 'description', 'equipment', 'load'],
  bus: ['busbar', 'bus', 'board', 'at', 'panel', 'connected to', 'fed from', 'feeder'],
  from: ['from', 'from busbar', 'upper busbar', 'hv busbar', 'fed from', 'source'],
  to: ['to', 'to busbar', 'lower busbar', 'lv busbar', 'destination'],
  on: ['in service', 'on', 'service', 'status'],
  nominalV: ['nominal voltage', 'voltage', 'u', 'un', 'rated voltage'],
  pcc: ['pcc', 'point of common coupling'],
  ratedKW: [
    'rated power',
    'power',
    'shaft power',
    'rated shaft power',
    'p',
    'pn',
    'p2',
    'rating',
    'motor power',
  ],
  kW: ['power', 'active power', 'p', 'load', 'demand'],
  count: ['number', 'count', 'quantity', 'qty', 'no', 'pieces', 'n'],
  loadPercent: ['load', 'loading', 'load factor', 'utilisation', 'utilization'],
  efficiency: ['efficiency', 'eta', 'eff'],
  powerFactor: [
    'power factor',
    'pf',
    'cos phi',
    'cosphi',
    'cos',
    'cos phi1',
    'displacement power factor',
    'dpf',
  ],
  ratedKVA: ['rated power', 'power', 'rating', 's', 'sn', 'sr', 'size'],
  ukPercent: [
    'uk',
    'impedance voltage',
    'impedance',
    'short-circuit voltage',
    'short circuit voltage',
    'z',
    'vk',
    'ukr',
  ],
  loadLossKW: ['load loss', 'pk', 'copper loss', 'load losses', 'short-circuit loss', 'pcu', 'pkr'],
  noLoadLossKW: ['no-load loss', 'p0', 'iron loss', 'no-load losses', 'no load loss', 'pfe'],
  noLoadCurrentPercent: ['no-load current', 'i0', 'no load current'],
  vectorGroup: ['vector group', 'group', 'connection', 'connection symbol'],
  hvV: ['rated high voltage', 'hv', 'primary voltage', 'high voltage', 'u1', 'primary', 'uhv', 'ur1'],
  lvV: ['rated low voltage', 'lv', 'secondary voltage', 'low voltage', 'u2', 'secondary', 'ulv', 'ur2'],
  tapPercent: ['tap', 'tap position'],
  lengthM: ['length', 'l', 'len'],
  resistanceOhmPerKm: ['resistance', 'r', "r'", 'r1', 'r per km'],
  reactanceOhmPerKm: ['reactance', 'x', "x'", 'x1', 'x per km'],
  runs: ['runs', 'parallel', 'cables in parallel', 'no of cables', 'parallel cables'],
  ratedA: ['rated current', 'current', 'ampacity', 'iz', 'i', 'in'],
  shortCircuitMVA: [
    'fault level',
    'short-circuit power',
    'short circuit power',
    'ssc',
    'sk',
    "sk''",
    'maximum fault level',
    'ssc max',
  ],
  shortCircuitMVAMin: ['minimum fault level', 'ssc min', 'skmin', 'fault level min'],
  xOverR: ['x/r', 'x over r', 'xr'],
  xdSubtransientPercent: ["xd''", 'xd', 'subtransient reactance', "x''d", 'x″d'],
  steps: ['steps', 'step', 'stages', 'step kvar', 'kvar'],
  ratedV: ['rated voltage', 'un', 'voltage', 'capacitor voltage', 'u'],
  detuningPercent: ['detuning', 'p', 'detuning p', 'reactor'],
  kvar: ['kvar', 'q', 'reactive power', 'net kvar', 'power'],
  tunedOrder: ['tuned order', 'order', 'n', 'tuning'],
  qFactor: ['quality', 'q', 'q factor', 'quality factor'],
  spectrum: ['spectrum', 'converter type', 'harmonics'],
  type: ['type', 'filter type'],
  inductanceMH: ['inductance', 'l'],
  resistanceOhm: ['resistance', 'r'],
  capacitanceUF: ['capacitance', 'c'],
};

/** The head in plain small words: no units in brackets, no signs, Greek letters spelled. */
function plain(head: string): string {
  return head
    .toLowerCase()
    .replace(/φ/g, 'phi')
    .replace(/η/g, 'eta')
    .replace(/[″"]/g, "''")
    .replace(/[′’]/g, "'")
    .replace(/[_·.:*]/g, ' ')
    .replace(/cos\s*phi\s*1?\b/, 'cos phi')
    .replace(/\s+/g, ' ')
    .trim();
}

/** Unit at the end of a head: "Power [kW]", "P in kW", "P / kW", "Power, kW", "Power kW", or the head itself. */
const unitPlaces: readonly RegExp[] = [
  /^(.*?)\s*[([]\s*([^)\]]+?)\s*[)\]]\s*$/,
  /^(.*\S)\s+in\s+(\S+)$/i,
  /^(.*\S)\s*\/\s*(\S+)$/,
  /^(.*\S)\s*,\s*(\S+)$/,
  /^(.*\S)\s+(\S+)$/,
  /^()(\S+)$/,
];

/** Whether a text is a unit; a lone letter could be anything and counts only in brackets or a unit row. */
export function isUnit(text: string): boolean {
  return text !== '' && typeof unitOf(text) === 'object';
}

interface Candidate {
  words: string;
  unit: string;
}

function candidatesOf(head: string): Candidate[] {
  const split = unitPlaces.flatMap((place, index): Candidate[] => {
    const match = place.exec(head);
    const unit = match?.[2] ?? '';
    const alone = index === unitPlaces.length - 1;
    // A letter alone could mean anything: "R" is no column in ohms.
    if (!match || !isUnit(unit) || (alone && /^[a-z]$/i.test(unit))) return [];
    return [{ words: plain(match[1] ?? ''), unit }];
  });
  return [{ words: plain(head), unit: '' }, ...split];
}

function wordsOf(owner: TableOwner, { key, label, field }: TableColumn): string[] {
  const own = [plain(label), plain(label.replace(/,.*$/, '')), plain(label.split(' ').at(-1) ?? '')];
  const kind = key === 'name' ? kindNames(owner) : [];
  return [...own, ...kind, plain(field.key), ...(otherWords[field.key] ?? []), plain(key)];
}

/** A list of cables has its names under "cable", or under the busbars' own word. */
function kindNames(owner: TableOwner): string[] {
  return owner === 'bus'
    ? ['busbar', 'bus', 'board']
    : [plain(kindWords[owner]), plain(shortKindWords[owner])];
}

function measures(column: TableColumn, unit: string): boolean {
  if (unit === '') return true;
  const [head, own] = [unitOf(unit), unitOf(column.unit)];
  return typeof head === 'object' && typeof own === 'object' && head.dimension === own.dimension;
}

/** How well a head fits a column, 0 for not at all: its own words, the trade's other words, the unit alone. */
function likeness(owner: TableOwner, column: TableColumn, { words, unit }: Candidate): number {
  if (!measures(column, unit)) return 0;
  const known = wordsOf(owner, column);
  const withUnit = unit === '' ? 0 : 1;
  if (words === '') return column.essential ? 1 + withUnit : 0;
  if (known.slice(0, 2).includes(words)) return 8 + withUnit;
  if (known.includes(words)) return 5 + withUnit + (column.essential ? 1 : 0);
  return words.length > 3 && known[0]?.startsWith(words) ? 3 + withUnit : 0;
}

/** Which columns a row of heads names; each column once, by the head that fits it best. */
export function readHeads(owner: TableOwner, heads: readonly string[]): ReadHead[] {
  const columns = tableColumns(owner);
  const pairs = heads.flatMap((head, index) =>
    candidatesOf(head).flatMap((candidate) =>
      columns.map((column) => ({
        index,
        column,
        unit: candidate.unit,
        score: likeness(owner, column, candidate),
      })),
    ),
  );
  const read: ReadHead[] = heads.map((head) => ({ key: null, unit: candidatesOf(head).at(-1)?.unit ?? '' }));
  const taken = new Set<string>();
  for (const { index, column, unit, score } of pairs.toSorted((a, b) => b.score - a.score)) {
    if (score === 0 || taken.has(column.key) || read[index]?.key !== null) continue;
    read[index] = { key: column.key, unit };
    taken.add(column.key);
  }
  return read;
}
