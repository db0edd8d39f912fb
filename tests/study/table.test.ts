import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  arrangeRows,
  cellText,
  checkStudy,
  columnValue,
  elementById,
  elementKinds,
  fieldOf,
  originOf,
  type Paste,
  type PasteChoices,
  type PastePlace,
  readCell,
  readPaste,
  type Study,
  setTable,
  studyInCase,
  type TableOwner,
  tableColumns,
  tablePaste,
  tableRecords,
  tabularText,
  typicalValues,
} from '../../src/study/index.ts';
import { decimalMark } from '../../src/study/table/decimalMark.ts';
import { readTabular } from '../../src/study/table/tabularText.ts';
import { deepFrozen, exampleStudy, studyFiles } from './exampleStudies.ts';

const detuned = deepFrozen(exampleStudy('1-detuned-400v'));
const owners: TableOwner[] = ['bus', ...elementKinds];

function site(): Study {
  return deepFrozen({
    format: 'varwright-study',
    version: 1,
    title: 'Two boards',
    frequencyHz: 50,
    buses: [
      { id: 'hv', name: 'Intake', nominalV: 20_000, pcc: true },
      { id: 'lv', name: 'Main board', nominalV: 400 },
    ],
    elements: [
      { id: 's', name: 'Grid', kind: 'supply', bus: 'hv', shortCircuitMVA: 250, xOverR: 10 },
      {
        id: 't1',
        name: 'T1',
        kind: 'transformer',
        from: 'hv',
        to: 'lv',
        ...typicalValues('transformer', { nominalV: 20_000, frequencyHz: 50 }),
      },
      { id: 'm1', name: 'Pump 1', kind: 'motor', bus: 'lv', ratedKW: 30 },
      { id: 'm2', name: 'Pump 2', kind: 'motor', bus: 'lv', ratedKW: 45, count: 2 },
    ],
    cases: [
      { id: 'base', name: 'Base', changes: [] },
      { id: 'night', name: 'Night', role: 'light', changes: [] },
    ],
  } as Study);
}

const atTop: PastePlace = { columns: ['name', 'bus', 'ratedKW'], rows: ['m1', 'm2'], bus: 'lv' };

function pasted(text: string, choices: PasteChoices = {}, owner: TableOwner = 'motor', place = atTop): Paste {
  return readPaste(site(), owner, text, place, choices);
}

function keysOf({ columns }: Paste): (string | null)[] {
  return columns.map(({ column }) => column?.key ?? null);
}

describe('A table of a kind', () => {
  it.each(owners)('of %s has a column for every field once, what the result hangs on first', (owner) => {
    const columns = tableColumns(owner);
    expect(columns[0]?.key).toBe('name');
    expect(new Set(columns.map(({ key }) => key)).size).toBe(columns.length);
    const places = columns.map(({ essential }, index) => (essential ? index : -1)).filter((at) => at >= 0);
    const rare = columns.findIndex(({ essential }) => !essential);
    expect(rare === -1 || Math.max(...places) < rare).toBe(true);
  });

  it('holds cells that read back as the values they show, of every field of the example studies', () => {
    for (const name of studyFiles) {
      const study = exampleStudy(name);
      for (const owner of owners) {
        for (const record of tableRecords(study, owner)) {
          for (const column of tableColumns(owner)) {
            const value = columnValue(record, column);
            if (value === undefined) continue;
            const text = cellText(study, column.field, value, 'plain');
            const where = `${name} ${record.id} ${column.key}: ${text}`;
            expect(readCell(study, column.field, text), where).toEqual({ ok: true, value });
          }
        }
      }
    }
  });

  it('sorts numbers by size, words as people do, absent values last, and filters by words of any column', () => {
    const study = site();
    const columns = tableColumns('motor');
    const column = (key: string) => columns.find((one) => one.key === key)!;
    const ids = (key: string, descending: boolean, text = '') =>
      arrangeRows(
        study,
        tableRecords(study, 'motor'),
        columns,
        { text, origin: 'any' },
        { column: column(key), descending },
      ).map(({ id }) => id);
    expect(ids('ratedKW', false)).toEqual(['m1', 'm2']);
    expect(ids('ratedKW', true)).toEqual(['m2', 'm1']);
    expect(ids('count', false)).toEqual(['m2', 'm1']);
    expect(ids('count', true)).toEqual(['m2', 'm1']);
    expect(ids('name', true, 'main 45')).toEqual(['m2']);
  });
});

describe('A cell is held to the rules of its field', () => {
  const study = site();
  const read: [TableOwner, string, string, unknown][] = [
    ['motor', 'ratedKW', '0,4 MW', 400],
    ['motor', 'ratedKW', '2*(75+15)', 180],
    ['motor', 'count', '', undefined],
    ['motor', 'on', 'x', true],
    ['motor', 'on', 'No', false],
    ['motor', 'bus', 'main board', 'lv'],
    ['motor', 'bus', 'main', 'lv'],
    ['motor', 'voltageFactorDesign', 'N', 'N'],
    ['filter', 'type', 'high', 'high-pass'],
    ['transformer', 'vectorGroup', 'Dyn5', 'Dyn5'],
    ['bank', 'steps', '2x25 + 50 off', [{ kvar: 25 }, { kvar: 25 }, { kvar: 50, on: false }]],
    ['bank', 'tolerancePercent', '-5 … 10', [-5, 10]],
    ['bank', 'tolerancePercent', '−5 to 10', [-5, 10]],
    ['converter', 'spectrum', 'Drive, 3 % input reactance', 'drive-reactance-3'],
    [
      'converter',
      'spectrum',
      '5: 38,2 % ∠174°, 7: 14 %',
      [
        { h: 5, percent: 38.2, angleDeg: 174 },
        { h: 7, percent: 14 },
      ],
    ],
  ];
  it.each(read)('%s %s: %j', (owner, key, text, value) => {
    expect(readCell(study, fieldOf(owner, key)!, text)).toEqual({ ok: true, value });
  });

  const refused: [TableOwner, string, string, RegExp][] = [
    ['motor', 'ratedKW', '-3', /−3.kW is not possible here; allowed is a number above 0 kW/],
    ['motor', 'ratedKW', '', /A value is needed/],
    ['motor', 'bus', 'Roof', /no busbar "Roof"; the study has Intake, Main board/],
    ['motor', 'on', 'perhaps', /neither yes nor no/],
    ['filter', 'type', 'notch', /allowed is single-tuned, high-pass/],
    ['transformer', 'vectorGroup', 'Dyn4', /cannot have the clock number 4/],
    ['bank', 'tolerancePercent', '5', /no pair of numbers/],
    ['converter', 'spectrum', 'tv sets', /no spectrum "tv sets"/],
    ['supply', 'background', 'much', /no order/],
  ];
  it.each(refused)('%s %s: %j is refused in a sentence', (owner, key, text, error) => {
    const outcome = readCell(study, fieldOf(owner, key)!, text);
    expect(outcome.ok ? '' : outcome.error).toMatch(error);
  });

  it('in the unit of its column’s head', () => {
    const field = fieldOf('motor', 'ratedKW')!;
    expect(readCell(study, field, '55000', { unit: 'W' })).toEqual({ ok: true, value: 55 });
    expect(readCell(study, field, '55 kW', { unit: 'W' })).toEqual({ ok: true, value: 55 });
    expect(readCell(study, field, '75', { unit: 'hp' })).toMatchObject({ ok: true });
    const strange = readCell(study, field, '55', { unit: 'kvar' });
    expect(strange.ok ? '' : strange.error).toContain('kvar, which does not measure rated shaft power');
    const factor = fieldOf('motor', 'powerFactor')!;
    expect(readCell(study, factor, '86', { unit: '%' })).toEqual({ ok: true, value: 0.86 });
  });
});

describe('Setting values of a table', () => {
  const study = site();
  const rows = [
    { id: 'm1', values: { ratedKW: 37, powerFactor: 0.86 } },
    { id: 'm2', values: { count: undefined, bus: 'hv', name: 'Pump two' } },
    { values: { name: 'Fan', ratedKW: 11, bus: 'lv' } },
    { values: { name: 'Lift' } },
  ];
  const edit = setTable(study, 'motor', rows, { words: 'paste 4 motors', place: 'lv' });

  it('is one step that changes rows, moves them, and adds new ones with typical values for what is open', () => {
    const after = edit.apply(study);
    expect(edit).toMatchObject({ label: 'motor.setTable', words: 'paste 4 motors' });
    expect(elementById(after, 'm1')).toMatchObject({ ratedKW: 37, powerFactor: 0.86 });
    expect(elementById(after, 'm2')).toEqual({
      id: 'm2',
      name: 'Pump two',
      kind: 'motor',
      bus: 'hv',
      ratedKW: 45,
    });
    const [fan, lift] = after.elements.slice(-2);
    expect(fan).toMatchObject({ name: 'Fan', ratedKW: 11, bus: 'lv' });
    expect(lift).toMatchObject({ name: 'Lift', ratedKW: 55, bus: 'lv' });
    expect(originOf(after, fan!, 'ratedKW')).toBeUndefined();
    expect(originOf(after, lift!, 'ratedKW')).toEqual({ origin: 'typical' });
    expect(checkStudy(after).findings.filter(({ severity }) => severity === 'error')).toEqual([]);
    expect(edit.apply(study)).toEqual(after);
    expect(setTable(study, 'motor', [], { words: 'nothing' }).apply(study)).toBe(study);
    expect(
      setTable(study, 'motor', [{ id: 'm1', values: { ratedKW: 30 } }], { words: 'the same' }).apply(study),
    ).toBe(study);
  });

  it('notes where the values come from', () => {
    const after = setTable(study, 'motor', rows, {
      words: 'paste 4 motors',
      place: 'lv',
      origin: { origin: 'nameplate', date: '2026-02' },
    }).apply(study);
    expect(originOf(after, elementById(after, 'm1')!, 'powerFactor')).toEqual({
      origin: 'nameplate',
      date: '2026-02',
    });
    expect(originOf(after, after.elements.at(-2)!, 'ratedKW')?.origin).toBe('nameplate');
    expect(originOf(after, after.elements.at(-1)!, 'ratedKW')?.origin).toBe('typical');
  });

  it('in a case changes that case alone; new parts belong to the base study', () => {
    const after = setTable(study, 'motor', rows, { words: 'w', place: 'lv', caseId: 'night' }).apply(study);
    expect(elementById(after, 'm1')).toBe(elementById(study, 'm1'));
    expect(elementById(studyInCase(after, 'night'), 'm1')).toMatchObject({ ratedKW: 37 });
    expect(elementById(after, 'm2')).toMatchObject({ name: 'Pump two', bus: 'lv', count: 2 });
    expect(elementById(studyInCase(after, 'night'), 'm2')).toMatchObject({ bus: 'hv' });
    expect(after.elements).toHaveLength(6);
  });

  it('keeps the other fields of a record, and drops an emptied one', () => {
    const bank = (after: Study) => elementById(after, 'bank');
    const set = (values: Record<string, unknown>, on: Study) =>
      setTable(on, 'bank', [{ id: 'bank', values }], { words: 'w' }).apply(on);
    const both = set({ 'controller.kCT': 300, 'controller.connectDelayS': 60 }, detuned);
    expect(bank(both)).toMatchObject({ controller: { kCT: 300, connectDelayS: 60 } });
    const one = set({ 'controller.kCT': undefined }, both);
    expect(bank(one)).toMatchObject({ controller: { connectDelayS: 60 } });
    expect(bank(one)).not.toHaveProperty('controller.kCT');
    expect(bank(set({ 'controller.connectDelayS': undefined }, one))).not.toHaveProperty('controller');
  });

  it('brings the lower busbar of a series part, or joins the one it names; busbars are rows too', () => {
    const cables = setTable(
      study,
      'cable',
      [{ values: { name: 'W1', from: 'lv', lengthM: 80 } }, { values: { from: 'lv', to: 'hv' } }],
      { words: 'w' },
    ).apply(study);
    expect(cables.buses).toHaveLength(3);
    expect(cables.elements.at(-1)).toMatchObject({ from: 'lv', to: 'hv' });
    const buses = setTable(
      study,
      'bus',
      [{ id: 'lv', values: { nominalV: 690 } }, { values: { name: 'Roof', nominalV: 400 } }],
      { words: 'w', origin: { origin: 'measured' } },
    ).apply(study);
    expect(buses.buses).toMatchObject([{ id: 'hv' }, { id: 'lv', nominalV: 690 }, { name: 'Roof' }]);
    expect(originOf(buses, buses.buses[1]!, 'nominalV')).toEqual({ origin: 'measured' });
  });
});

describe('Text from a spreadsheet', () => {
  const cells: [string, string[][]][] = [
    [
      'a\tb\nc\td\n',
      [
        ['a', 'b'],
        ['c', 'd'],
      ],
    ],
    [
      'a\tb\r\n\r\n c \td',
      [
        ['a', 'b'],
        ['c', 'd'],
      ],
    ],
    ['"two\nlines"\t"a ""quoted"" word"', [['two lines', 'a "quoted" word']]],
    [
      '5" pipe\t1\n"6" pipe\t2',
      [
        ['5" pipe', '1'],
        ['"6" pipe', '2'],
      ],
    ],
    [
      '"open\t1\n"other\t2',
      [
        ['"open', '1'],
        ['"other', '2'],
      ],
    ],
    [
      'name;kW\nPump;3,5',
      [
        ['name', 'kW'],
        ['Pump', '3,5'],
      ],
    ],
    [
      'name,kW\nPump,3.5',
      [
        ['name', 'kW'],
        ['Pump', '3.5'],
      ],
    ],
    ['3,5\n4,5', [['3,5'], ['4,5']]],
    ['\ufeffa\tb', [['a', 'b']]],
  ];
  it.each(cells)('%j', (text, rows) => {
    expect(readTabular(text).rows.map((row) => row.cells)).toEqual(rows);
  });

  it('written by this programme reads back the same, whatever stands in the cells', () => {
    const cell = fc.string({ maxLength: 12 }).map((text) => text.replace(/[\n\r\u2028\u2029]/g, ' ').trim());
    fc.assert(
      fc.property(
        fc.array(fc.array(cell, { minLength: 2, maxLength: 4 }), { minLength: 1, maxLength: 6 }),
        (rows) => {
          const filled = rows.filter((row) => row.some((one) => one !== ''));
          fc.pre(filled.length > 0 && !filled[0]![0]!.startsWith('\ufeff'));
          expect(readTabular(tabularText(rows)).rows.map((row) => row.cells)).toEqual(filled);
        },
      ),
      { seed: 9, numRuns: 500 },
    );
  });

  const marks: [string[], ReturnType<typeof decimalMark>][] = [
    [['1,250', '0,85'], { decimal: ',', guessed: false, mixed: false }],
    [['1,250', '0.85'], { decimal: '.', guessed: false, mixed: false }],
    [['1,250', '37'], { decimal: undefined, guessed: true, mixed: false }],
    [['1.250,5'], { decimal: ',', guessed: false, mixed: false }],
    [['1\u202f250,5'], { decimal: ',', guessed: false, mixed: false }],
    [["1'250.5"], { decimal: '.', guessed: false, mixed: false }],
    [['1,250,000'], { decimal: '.', guessed: false, mixed: false }],
    [['0,9', '0.9'], { decimal: undefined, guessed: false, mixed: true }],
    [['37', '45', 'Dyn11'], { decimal: undefined, guessed: false, mixed: false }],
  ];
  it.each(marks)('%j: the decimal mark is judged from all cells together', (texts, mark) => {
    expect(decimalMark(texts)).toEqual(mark);
  });
});

describe('A pasted table is understood', () => {
  it('by its heads, whatever their order, with units in heads, decimal comma and thousands', () => {
    const paste = pasted(
      'Qty\tMotor\tPower [W]\tcos φ\tNotes\n2\tPump 1\t37\u202f000,5\t0,86\told\n1\tFan\t5\u00a0500\t0,8\t-',
    );
    expect(keysOf(paste)).toEqual(['count', 'name', 'ratedKW', 'powerFactor', null]);
    expect(paste).toMatchObject({ header: true, unitRow: false, mark: { used: ',' } });
    expect(paste.rows).toMatchObject([
      { line: 2, id: 'm1', fate: 'change', values: { count: 2, ratedKW: 37.0005, powerFactor: 0.86 } },
      { line: 3, id: undefined, name: 'Fan', fate: 'new', values: { name: 'Fan', ratedKW: 5.5 } },
    ]);
    expect(paste.columns[4]).toMatchObject({ head: 'Notes', column: null });
  });

  it('with a row of units under the heads', () => {
    const paste = pasted('Name\tRated power\tLoad\n\tkW\t%\nPump 2\t55\t80');
    expect(paste).toMatchObject({ header: true, unitRow: true });
    expect(paste.rows).toHaveLength(1);
    expect(paste.rows[0]).toMatchObject({ id: 'm2', values: { ratedKW: 55, loadPercent: 80 } });
  });

  it('by place where there are no heads: names first, or row for row from the cell down', () => {
    const named = pasted('Pump 2\tMain board\t55\nFan\tMain board\t11');
    expect(keysOf(named)).toEqual(['name', 'bus', 'ratedKW']);
    expect(named.rows.map(({ fate }) => fate)).toEqual(['change', 'new']);
    const numbers = pasted('37\t0.86\n55\t0.88\n11\t0.8', {}, 'motor', {
      columns: ['ratedKW', 'powerFactor'],
      rows: ['m1', 'm2'],
      bus: 'lv',
    });
    expect(numbers.header).toBe(false);
    expect(numbers.rows.map(({ id, fate }) => [id, fate])).toEqual([
      ['m1', 'change'],
      ['m2', 'change'],
      [undefined, 'new'],
    ]);
  });

  it('and each guess can be changed', () => {
    const text = '1,250\t3\n37\t4';
    const place = { columns: ['ratedKW', 'count'], rows: ['m1', 'm2'] };
    const guess = pasted(text, {}, 'motor', place);
    expect(guess.mark).toMatchObject({ guessed: true, used: undefined });
    expect(guess.rows[0]?.values.ratedKW).toBe(1.25);
    expect(pasted(text, { decimal: '.' }, 'motor', place).rows[0]?.values.ratedKW).toBe(1250);
    const other = pasted(text, { columns: { 1: 'loadPercent', 0: null } }, 'motor', place);
    expect(keysOf(other)).toEqual([null, 'loadPercent']);
    expect(other.rows.map(({ values }) => values)).toEqual([{ loadPercent: 3 }, { loadPercent: 4 }]);
    expect(keysOf(pasted(text, { columns: { 1: 'ratedKW' } }, 'motor', place))).toEqual([null, 'ratedKW']);
    expect(pasted(text, { header: true }, 'motor', place).rows).toHaveLength(1);
    expect(pasted(text, { without: new Set([2]) }, 'motor', place).rows[1]?.fate).toBe('left out');
    expect(pasted(text, { cells: { '2 0': '0,75' } }, 'motor', place).rows[1]?.values.ratedKW).toBe(0.75);
  });

  it('with every wrong cell named, the others taken', () => {
    const paste = pasted('Name\tkW\tcos φ\nPump 1\tabout 37\t0.86\nFan\t11\t1.2');
    expect(paste.rows.map(({ cells }) => cells.map(({ error }) => error !== null))).toEqual([
      [false, true, false],
      [false, false, true],
    ]);
    expect(paste.rows[0]?.values).toEqual({ powerFactor: 0.86 });
    expect(paste.rows[1]?.cells[2]?.error).toContain('allowed is');
  });

  it('a name that stands twice, a new part without a busbar, and a busbar nobody knows are said', () => {
    const twice = pasted('Name\tkW\nFan\t11\nfan\t12');
    expect(twice.rows[1]).toMatchObject({ fate: 'refused', error: 'Line 2 names the same already.' });
    const homeless = pasted('Name\tkW\nFan\t11', {}, 'motor', { columns: [], rows: [] });
    expect(homeless.rows[0]).toMatchObject({
      fate: 'refused',
      error: expect.stringContaining('needs a busbar'),
    });
    const lost = pasted('Name\tBusbar\tkW\nFan\tRoof\t11');
    expect(lost.rows[0]).toMatchObject({ fate: 'refused' });
    expect(lost.rows[0]?.cells[1]?.error).toContain('no busbar "Roof"');
  });

  const heads: [TableOwner, string, (string | null)[]][] = [
    [
      'transformer',
      'Name\tS [kVA]\tuk %\tPk (kW)\tVector group\tU1 / V\tU2 / V',
      ['name', 'ratedKVA', 'ukPercent', 'loadLossKW', 'vectorGroup', 'hvV', 'lvV'],
    ],
    [
      'cable',
      'Tag\tFrom\tTo\tLength m\tR Ω/km\tX Ω/km\tRuns\tIz A',
      ['name', 'from', 'to', 'lengthM', 'resistanceOhmPerKm', 'reactanceOhmPerKm', 'runs', 'ratedA'],
    ],
    ['converter', 'Name\tBoard\tP kW\tcos phi\tSpectrum', ['name', 'bus', 'kW', 'powerFactor', 'spectrum']],
    ['bank', 'Name\tsteps\tUn [V]\tdetuning [%]', ['name', 'steps', 'ratedV', 'detuningPercent']],
    [
      'supply',
      'Name\tSsc MVA\tSsc min MVA\tX/R',
      ['name', 'shortCircuitMVA', 'shortCircuitMVAMin', 'xOverR'],
    ],
    ['load', 'kW\tpf\tname', ['kW', 'powerFactor', 'name']],
    ['bus', 'Busbar\tVoltage [kV]\tPCC', ['name', 'nominalV', 'pcc']],
  ];
  it.each(heads)('%s by the heads %j', (owner, head, keys) => {
    expect(keysOf(readPaste(site(), owner, `${head}\n\n`, atTop, { header: true }))).toEqual(keys);
  });

  it('by its own heads of every kind, so that a copied table can be pasted again', () => {
    for (const owner of owners) {
      const columns = tableColumns(owner);
      const head = columns.map(({ label, unit }) => (unit ? `${label} [${unit}]` : label)).join('\t');
      const read = readPaste(site(), owner, head, atTop, { header: true });
      expect(keysOf(read), owner).toEqual(columns.map(({ key }) => key));
    }
  });
});

describe('A paste is taken into the study', () => {
  const words = (rows: readonly unknown[]) => `paste ${rows.length} rows`;

  it('as one step; rows the rules of the study refuse are marked and left out', () => {
    const study = site();
    // Pk of 90 kW makes R larger than |Z|: the study's own rule refuses it.
    const paste = readPaste(study, 'transformer', 'Name\tkVA\tPk [kW]\nT1\t1000\t90\nT2\t630\t4.6', {
      columns: [],
      rows: [],
      bus: 'hv',
    });
    const { edit, rows, errors } = tablePaste(study, 'transformer', paste, { words, place: 'hv' });
    expect(errors).toEqual([]);
    expect(rows).toMatchObject([
      { fate: 'refused', error: expect.stringContaining('R larger') },
      { fate: 'new' },
    ]);
    const after = edit!.apply(study);
    expect(edit!.words).toBe('paste 1 rows');
    expect(elementById(after, 't1')).toBe(elementById(study, 't1'));
    expect(after.elements.at(-1)).toMatchObject({ name: 'T2', ratedKVA: 630, loadLossKW: 4.6, from: 'hv' });
    expect(edit!.apply(study)).toEqual(after);
  });

  it('and nothing is left to do where every row is already so', () => {
    const study = site();
    const paste = readPaste(study, 'motor', 'Name\tkW\nPump 1\t30', atTop);
    expect(paste.rows[0]?.fate).toBe('same');
    expect(tablePaste(study, 'motor', paste, { words }).edit).toBeNull();
  });

  it('a copied table pasted again changes nothing, of every kind of the example studies', () => {
    for (const name of studyFiles) {
      const study = exampleStudy(name);
      for (const owner of owners) {
        const columns = tableColumns(owner);
        const records = tableRecords(study, owner);
        const text = tabularText([
          columns.map(({ label, unit }) => (unit ? `${label} [${unit}]` : label)),
          ...records.map((record) =>
            columns.map((column) => {
              const value = column.key === 'name' ? (record.name ?? record.id) : columnValue(record, column);
              return cellText(study, column.field, value, 'plain');
            }),
          ),
        ]);
        const paste = readPaste(study, owner, text, { columns: [], rows: [] });
        expect(
          paste.rows.map(({ fate, error }) => [fate, error]),
          `${name} ${owner}`,
        ).toEqual(records.map(() => ['same', null]));
      }
    }
  });
});

describe('Any text', () => {
  const cell = fc.oneof(
    fc.constantFrom(
      '',
      '-',
      'Pump 1',
      'Pump 2',
      'Fan',
      '"A, B"',
      'Main board',
      'Roof',
      'kW',
      'W',
      '%',
      'name',
      'Power [kW]',
      'cos φ',
    ),
    fc.constantFrom(
      '55',
      '0,85',
      '0.85',
      '1 250,5',
      "1'250.5",
      '1\u2009250',
      '1,250',
      '2x',
      '−3',
      '1e3',
      '55 kW',
      '5" pipe',
    ),
    fc.string({ maxLength: 8 }),
  );
  const grid = fc.array(fc.array(cell, { minLength: 1, maxLength: 5 }), { minLength: 1, maxLength: 8 });

  it('pasted never loses a row unsaid, never throws, and what is taken leaves a sound study', () => {
    fc.assert(
      fc.property(grid, fc.constantFrom('\t', ';'), fc.constantFrom('\n', '\r\n'), (rows, separator, end) => {
        const study = site();
        const text = rows.map((row) => row.join(separator)).join(end);
        const paste = readPaste(study, 'motor', text, atTop);
        const lines = readTabular(text);
        const spoken = paste.rows.length + (paste.header ? 1 : 0) + (paste.unitRow ? 1 : 0);
        expect(spoken).toBe(lines.rows.length);
        for (const row of paste.rows) {
          const written = lines.rows.find(({ line }) => line === row.line)!.cells;
          expect(row.cells.map((one) => one.text).slice(0, written.length)).toEqual(written);
          for (const [index, one] of row.cells.entries()) {
            const column = paste.columns[index]?.column;
            const isMissing = one.value === undefined && one.error === null;
            // A cell under a column is a value, an error, or a sign for "not given"; never just gone.
            if (column && isMissing) expect(one.text.trim()).toMatch(/^(|[-–—?]|n\/?a|#n\/a|n\.a\.|tbd)$/i);
          }
        }
        const { edit } = tablePaste(study, 'motor', paste, { words: () => 'paste', place: 'lv' });
        if (edit) {
          const after = edit.apply(study);
          expect(checkStudy(after).findings.filter(({ severity }) => severity === 'error')).toEqual([]);
          expect(edit.apply(study)).toEqual(after);
        }
      }),
      { seed: 77, numRuns: 300 },
    );
  });
});
