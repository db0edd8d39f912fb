import { describe, expect, it } from 'vitest';
import { busReading, terminalReading } from '../../src/engine/index.ts';
import { fixed, significant } from '../../src/sheet/document/formatNumber.ts';
import {
  type Block,
  buildDocument,
  type Section,
  type SheetDocument,
  type SheetInput,
  type TableBlock,
} from '../../src/sheet/document/index.ts';
import { inputOf, quarry, verdict } from './sampleInput.ts';

const pass = verdict({
  check: 'bank-current',
  caseId: 'day',
  withoutCorrection: { value: 0.2, verdict: 'pass' },
});
const fail = verdict({
  check: 'bank-voltage',
  caseId: 'night',
  value: 1.21,
  limit: 1.1,
  margin: -0.1,
  verdict: 'fail',
  mend: 'Choose a higher rated voltage.',
});
const unknown = verdict({
  check: 'discharge',
  caseId: 'day',
  value: null,
  limit: null,
  margin: null,
  verdict: 'unknown',
  remarks: ['the discharge resistor is not given'],
});
const sectionOf = (document: SheetDocument, id: string): Section => {
  const found = document.sections.find((section) => section.id === id);
  if (!found) throw new Error(`no section ${id}`);
  return found;
};
const tablesOf = (section: Section): TableBlock[] =>
  section.blocks.filter((block): block is TableBlock => block.kind === 'table');
const textOf = (blocks: readonly Block[]): string =>
  JSON.stringify(blocks).replaceAll(/\\u00a0|\u00a0/g, ' ');
const resultLines = (input: SheetInput): string[] => {
  const [list] = sectionOf(buildDocument(input), 'result').blocks;
  return list?.kind === 'list' ? list.items.map((item) => item.replaceAll('\u00a0', ' ')) : [];
};
const rowsUnder = (table: TableBlock, group: string): string[][] => {
  const from = table.rows.findIndex((row) => row.kind === 'group' && row.text === group);
  const rest = table.rows.slice(from + 1);
  const to = rest.findIndex((row) => row.kind === 'group');
  return (to < 0 ? rest : rest.slice(0, to)).map((row) =>
    row.kind === 'cells' ? row.cells.map(({ text }) => text) : [],
  );
};

describe('the result in five lines', () => {
  it('names the correction and the power factor of the busiest case with it and without', () => {
    const input = inputOf(quarry, [pass]);
    const [first] = resultLines(input);
    const solution = input.cases[0]?.solution;
    const bare = input.cases[0]?.without;
    if (!solution || !bare) throw new Error('no solution');
    const grid = solution.terminals.findIndex(({ element }) => element === 'grid');
    const withIt = Math.abs(terminalReading(solution, grid).displacementPF ?? 0);
    const bareGrid = bare.terminals.findIndex(({ element }) => element === 'grid');
    const without = Math.abs(terminalReading(bare, bareGrid).displacementPF ?? 0);
    expect(first).toContain('Bank C1, 125 kvar at Main board, 7 % detuned, steps 2 × 50 + 1 × 25');
    expect(first).toContain(`Day: cos φ ${significant(withIt, 3)} lagging with the correction`);
    expect(first).toContain(`cos φ ${significant(without, 3)} lagging without`);
    expect(without).toBeLessThan(withIt);
  });

  it('says which limit is exceeded, by how much, where and in which case', () => {
    const [, judged] = resultLines(inputOf(quarry, [pass, fail, unknown]));
    expect(judged).toContain('Fails: bank voltage at Bank C1, 1.21 p.u. against 1.10 p.u., in Night.');
    expect(judged).toContain('3 verdicts over 3 cases: 1 pass, 0 to watch, 1 fail, 1 without verdict');
  });

  it('names the smallest margin among the limits kept when nothing fails', () => {
    const [, judged, binding] = resultLines(inputOf(quarry, [pass]));
    expect(judged).toMatch(/^Nothing that was judged fails/);
    expect(binding).toContain('+0.15: bank current at Bank C1, 1.10 p.u. against 1.30 p.u., in Day');
  });

  it('never lets a screening rule be the smallest margin', () => {
    const screen = verdict({ check: 'amplification', caseId: 'day', margin: 0.01, screening: true });
    expect(resultLines(inputOf(quarry, [pass, screen]))[2]).toContain('bank current');
  });

  it('says what fails without the correction', () => {
    const worse = verdict({
      check: 'bus-thd',
      title: 'voltage distortion (THD)',
      caseId: 'day',
      withoutCorrection: { value: 9.4, verdict: 'fail' },
    });
    expect(resultLines(inputOf(quarry, [pass, worse]))[3]).toContain(
      'Without the correction this fails: voltage distortion (THD) at Bank C1, 9.40 p.u. (Day)',
    );
    expect(resultLines(inputOf(quarry, [pass]))[3]).toBe(
      'Without the correction none of the 1 verdict compared fails.',
    );
  });

  it('counts a power factor below its target without the correction', () => {
    const target = verdict({ check: 'target-pf', caseId: 'day', unit: '', value: 0.97, limit: 0.95 });
    expect(resultLines(inputOf(quarry, [target]))[3]).toMatch(/cos φ 0\.8\d+ lagging against 0\.950 \(Day\)/);
  });

  it('lists what is open: unsolved cases, missing data, the minimum fault level', () => {
    const open = resultLines(inputOf(quarry, [unknown]))[4];
    expect(open).toContain('not solved: Overload');
    expect(open).toContain('1 check without verdict for want of data (discharge)');
    expect(open).toContain('minimum fault level of Grid at Intake');
  });

  it('claims nothing when nothing was judged', () => {
    const lines = resultLines(inputOf(quarry, []));
    expect(lines[1]).toBe('No check has been computed, so nothing is judged.');
    expect(lines[3]).toBe('The site without the correction has not been judged.');
  });

  it('says so when the study has no correction', () => {
    const bare = { ...quarry, elements: quarry.elements.filter(({ kind }) => kind !== 'bank') };
    expect(resultLines(inputOf(bare, []))[0]).toMatch(/^The study holds no bank or filter/);
  });
});

describe('the tables of the sheet', () => {
  const input = inputOf(quarry, [pass, fail, unknown]);
  const document = buildDocument(input);

  it('list every busbar in every solved case with the voltages of the solution', () => {
    const [table] = tablesOf(sectionOf(document, 'busbars'));
    if (!table) throw new Error('no table');
    for (const [index, name] of ['Day', 'Night'].entries()) {
      const rows = rowsUnder(table, name);
      expect(rows.map(([bus]) => bus)).toEqual(['Intake', 'Main board']);
      const solution = input.cases[index]?.solution;
      if (!solution) throw new Error('no solution');
      const reading = busReading(solution, 1);
      expect(rows[1]?.[1]).toBe(significant(reading.rmsLL[0], 4));
      expect(rows[1]?.[5]).toBe(fixed(Math.max(...reading.thdPercent.map((value) => value ?? 0)), 2));
    }
  });

  it('give the reason in place of figures for a case that has none', () => {
    for (const id of ['busbars', 'terminals']) {
      const [table] = tablesOf(sectionOf(document, id));
      const group = table?.rows.find((row) => row.kind === 'group' && row.text === 'Overload');
      const error = input.cases[2]?.solution.error ?? '';
      expect(error).not.toBe('');
      expect(group?.kind === 'group' && group.aside).toBe(`no figures: ${error}`);
    }
  });

  it('list every terminal of every solved case, sources counted out of the part', () => {
    const [table] = tablesOf(sectionOf(document, 'terminals'));
    if (!table) throw new Error('no table');
    const solution = input.cases[0]?.solution;
    if (!solution) throw new Error('no solution');
    const rows = rowsUnder(table, 'Day');
    expect(rows).toHaveLength(solution.terminals.length);
    const grid = rows.find(([part]) => part === 'Grid');
    const index = solution.terminals.findIndex(({ element }) => element === 'grid');
    expect(grid?.[2]).toBe('out of');
    expect(grid?.[3]).toBe(significant(-terminalReading(solution, index).kW, 4));
    expect(grid?.[10]).toBe('lagging');
    expect(rows.find(([part]) => part === 'Bank C1')?.[10]).toBe('capacitive');
  });

  it('hold every verdict once with its equation, numbers, margin and source', () => {
    const text = textOf(sectionOf(document, 'verdicts').blocks);
    const rows = tablesOf(sectionOf(document, 'verdicts')).flatMap((table) => table.rows);
    expect(rows.filter((row) => row.kind === 'cells')).toHaveLength(3);
    expect(text).toContain('I_rms / I_N');
    expect(text).toContain('110 A / 100 A = 1.1');
    expect(text).toContain('−0.10');
    expect(text).toContain('IEC 60831-1:2014, maximum current ³');
    expect(text).toContain('³ from memory. Check ³ against the edition in force before approval.');
    expect(text).toContain('Choose a higher rated voltage.');
    expect(text).toContain('the discharge resistor is not given.');
  });

  it('never print a number for a verdict that has none', () => {
    const [row] = tablesOf(sectionOf(document, 'verdicts'))
      .flatMap((table) => table.rows)
      .filter((item) => item.kind === 'cells' && item.cells[0]?.text === 'unknown');
    expect(row?.kind === 'cells' && row.cells.slice(3, 6).map(({ text }) => text)).toEqual([
      'none',
      'none',
      'none',
    ]);
  });

  it('tell entered data with their origin from defaults that are assumptions', () => {
    const text = textOf(sectionOf(document, 'data').blocks);
    expect(text).toContain('nameplate (2019-05-06)');
    expect(text).toContain('default, assumed');
    expect(text).toContain('not stated');
    expect(text).toContain('Invented for the tests.');
  });

  it('list missing data and unsolved cases as open points', () => {
    const text = textOf(sectionOf(document, 'open-points').blocks);
    expect(text).toContain(
      'No verdict on discharge at Bank C1: the discharge resistor is not given. In Day.',
    );
    expect(text).toContain('Case Overload has no results');
  });

  it('name every document used once, with how well it is known', () => {
    const [table] = tablesOf(sectionOf(document, 'limits'));
    expect(table?.rows).toHaveLength(1);
    expect(textOf(table ? [table] : [])).toContain('³ from memory');
  });

  it('give the orders present at each busbar beside the limits that judge it', () => {
    const tables = tablesOf(sectionOf(document, 'harmonics'));
    const orders = tables.flatMap((table) =>
      table.rows.map((row) => row.kind === 'cells' && row.cells[0]?.text),
    );
    expect(orders).toContain('5');
    expect(orders).not.toContain('4');
  });

  it('give the ratings a bank is ordered by', () => {
    const [table] = tablesOf(sectionOf(document, 'correction'));
    const row = table?.rows[0];
    const texts = row?.kind === 'cells' ? row.cells.map(({ text }) => text) : [];
    // Delta: C = Q/(3·ω·U²) = 125 000/(3·314.159·440²) = 685.1 µF; L = p·U²/(ω·Q) = 0.07·440²/(314.159·125 000) = 0.3451 mH
    expect(texts).toContain('685.1');
    expect(texts).toContain('0.3451');
    expect(texts).toContain('3.78');
    expect(texts).toContain('164.0');
  });
});

describe('the document', () => {
  const verdicts = [pass, fail, unknown];

  it('is the same for the same input and does not depend on the order of cases', () => {
    const input = inputOf(quarry, verdicts);
    const turned = { ...input, cases: [...input.cases].reverse() };
    expect(JSON.stringify(buildDocument(turned))).toBe(JSON.stringify(buildDocument(input)));
  });

  it('carries the date of the revision and no other', () => {
    const document = buildDocument(inputOf(quarry, verdicts));
    expect(document.revisionDate).toBe('2026-03-04');
    expect(document.subtitle).toBe('Stonefold quarry (invented) · revision B · 2026-03-04');
    expect(document.shortFingerprint).toBe('study 0123-4567');
    const { revisionDate, ...undated } = quarry;
    expect(revisionDate).toBe('2026-03-04');
    expect(buildDocument(inputOf(undated, verdicts)).revisionDate).toBeUndefined();
  });

  it('never holds a number that was not computed', () => {
    const text = JSON.stringify(buildDocument(inputOf(quarry, verdicts)));
    expect(text).not.toMatch(/NaN|Infinity|undefined|\[object/);
  });

  it('refuses a computed case the study does not have', () => {
    const input = inputOf(quarry, verdicts);
    const [first] = input.cases;
    if (!first) throw new Error('no case');
    expect(() => buildDocument({ ...input, cases: [{ ...first, caseId: 'dawn' }] })).toThrow(
      /no case "dawn"/,
    );
  });

  it('says what was not computed for a study without any results', () => {
    const document = buildDocument({ ...inputOf(quarry, []), cases: [], pins: [] });
    expect(textOf(sectionOf(document, 'busbars').blocks)).toContain('no figures: not computed');
    expect(textOf(sectionOf(document, 'open-points').blocks)).toContain(
      'Case Day has no results: not computed',
    );
  });
});
