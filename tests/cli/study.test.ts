import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { ResultsFile } from '../../src/engine/index.ts';
import { site } from '../store/site.ts';
import { disagreements } from './disagreements.ts';
import { referenceStudy, runStudy } from './runStudy.ts';

let folder: string;
const path = (name: string): string => join(folder, name);

function write(name: string, content: unknown): string {
  writeFileSync(path(name), typeof content === 'string' ? content : JSON.stringify(content));
  return path(name);
}

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'varwright-cli-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe('the study command on the reference studies', () => {
  // An independent dense solution of the study format's page; every kind, cases, scans; checks left out.
  for (const name of ['1-detuned-400v', '2-four-wire-480v', '3-filters-6k6-alpha']) {
    it(`writes the results file of ${name} to the format's tolerance, exits 0 and leaves no other file`, () => {
      const out = path(`${name}.results.json`);
      const { status, stderr } = runStudy(referenceStudy(name), '--out', out);
      expect(stderr).toBe('');
      expect(status).toBe(0);
      const results = JSON.parse(readFileSync(out, 'utf8')) as ResultsFile;
      const expected = JSON.parse(readFileSync(referenceStudy(`${name}.expected`), 'utf8')) as ResultsFile;
      expect(disagreements(results, expected)).toEqual([]);
      expect(readdirSync(folder).filter((file) => file.endsWith('.part'))).toEqual([]);
    });
  }

  it('writes exactly the keys of the results format, checks included', () => {
    const out = path('keys.json');
    runStudy(referenceStudy('1-detuned-400v'), '--out', out);
    const results = JSON.parse(readFileSync(out, 'utf8')) as ResultsFile;
    expect(Object.keys(results)).toEqual(['format', 'version', 'cases', 'warnings']);
    const solved = results.cases[0] as ResultsFile['cases'][number];
    const sorted = (record: object | undefined): string[] => Object.keys(record ?? {}).sort();
    expect(sorted(solved)).toEqual([
      'buses',
      'checks',
      'converged',
      'id',
      'iterations',
      'scans',
      'terminals',
    ]);
    expect(sorted(solved.buses[0])).toEqual(['id', 'orders', 'rmsLL', 'rmsV', 'thdPercent']);
    expect(sorted(solved.terminals[0])).toEqual([
      'bus',
      'displacementPF',
      'element',
      'kVA',
      'kW',
      'kvar',
      'neutralRmsA',
      'orders',
      'rmsA',
      'thdPercent',
      'truePF',
    ]);
    expect(sorted(solved.scans[0])).toEqual(['bus', 'points', 'resonances', 'sequence']);
    expect(solved.checks.length).toBeGreaterThan(0);
    for (const check of solved.checks) {
      const { bus, element, ...rest } = check;
      expect([bus, element].filter((id) => id !== undefined)).toHaveLength(1);
      expect(sorted(rest)).toEqual(['check', 'limit', 'margin', 'source', 'unit', 'value', 'verdict']);
      expect(['pass', 'watch', 'fail', 'unknown']).toContain(check.verdict);
    }
  });
});

describe('the summary', () => {
  it('names cases, busbars, terminals, resonances and verdicts with units, within 100 columns', () => {
    const { stdout } = runStudy(referenceStudy('1-detuned-400v'));
    const lines = stdout.split('\n');
    expect(lines.filter((line) => line.length > 100)).toEqual([]);
    // The figures stand in the expected results: hall 425.86 V, THD 2.31 %; grid −401.4 kW, 20.9 A.
    expect(
      lines.some((line) => /^ +Press hall +400 +425\.9 +425\.9 +425\.9 +106\.5 +2\.31$/.test(line)),
    ).toBe(true);
    expect(
      lines.some((line) =>
        /^ +grid +Intake +-401\.4 +-49\.1 +-0\.993 +-0\.990 +20\.9 +0\.0 +6\.7$/.test(line),
      ),
    ).toBe(true);
    expect(lines.some((line) => /^ +3\.628 +181\.4 +parallel +0\.2184 +64\.9$/.test(line))).toBe(true);
    expect(stdout).toMatch(/Case .*\(plain\): converged/);
    expect(stdout).toMatch(/Verdicts: \d+ fail, \d+ watch, \d+ unknown, \d+ pass/);
    expect(stdout).toMatch(/Busbar +Un V +U12 V +U23 V +U31 V +U\/Un % +THD U %/);
    expect(stdout).toMatch(/Part +at busbar +kW +kvar +cos φ +PF +A +neutral A +THD I %/);
  });

  it('never shows a number that could not be computed', () => {
    const { stdout } = runStudy(referenceStudy('3-filters-6k6-alpha'));
    expect(stdout).not.toMatch(/NaN|Infinity|undefined|null|-0\.0\b(?!\d)/);
    expect(stdout).toMatch(/hv.* no path to a source/);
  });
});

describe('exit status', () => {
  it('is 1 where a case does not converge; the other cases are still solved and the results written', () => {
    const heavy = {
      ...site,
      cases: [
        { id: 'day', changes: [] },
        { id: 'rush', changes: [{ element: 'pumps', set: { count: 400 } }] },
      ],
    };
    const out = path('heavy.json');
    const { status, stdout } = runStudy(write('heavy-study.json', heavy), '--out', out);
    expect(status).toBe(1);
    expect(stdout).toContain('Case rush: did not converge');
    const [day, rush] = (JSON.parse(readFileSync(out, 'utf8')) as ResultsFile).cases;
    expect(day?.converged).toBe(true);
    expect(rush).toMatchObject({ converged: false, buses: [], terminals: [], checks: [] });
    expect(rush?.error).toBeTruthy();
  });

  it('is 1 with --strict where a verdict fails, 0 without', () => {
    const failing = {
      ...site,
      elements: [
        ...site.elements,
        { id: 'c2', kind: 'bank', bus: 'main', ratedV: 300, steps: [{ kvar: 50 }] },
      ],
    };
    const file = write('failing.json', failing);
    expect(runStudy(file).status).toBe(0);
    expect(runStudy(file, '--strict').status).toBe(1);
  });
});

describe('bad input', () => {
  const broken = {
    ...site,
    buses: [
      { id: 'in', nominalV: -1 },
      { id: 'main', nominalV: 400 },
    ],
    frequencyHz: 55,
  };

  it('exits 2 with every finding on the error output, nothing on the other, and no file touched', () => {
    const out = write('untouched.json', 'as it was');
    const { status, stdout, stderr } = runStudy(write('broken.json', broken), '--out', out);
    expect(status).toBe(2);
    expect(stdout).toBe('');
    expect(stderr).toContain('$.buses[0].nominalV');
    expect(stderr).toContain('$.frequencyHz');
    expect(readFileSync(out, 'utf8')).toBe('as it was');
    expect(runStudy(path('broken.json'), '--out', path('never.json')).status).toBe(2);
    expect(existsSync(path('never.json'))).toBe(false);
  });

  it('exits 2 for text that is no JSON, naming line and column', () => {
    const { status, stderr } = runStudy(write('text.json', '{\n  "format": oops }'));
    expect(status).toBe(2);
    expect(stderr).toContain('line 2');
  });

  it('exits 2 for a file that cannot be read', () => {
    const { status, stderr } = runStudy(path('missing.json'));
    expect(status).toBe(2);
    expect(stderr).toContain('missing.json cannot be read');
  });

  it('exits 2 for options that cannot be meant, and says how to call it', () => {
    for (const args of [[], ['a.json', 'b.json'], ['a.json', '--fast'], ['a.json', '--out']]) {
      const { status, stdout, stderr } = runStudy(...args);
      expect({ args, status, stdout }).toEqual({ args, status: 2, stdout: '' });
      expect(stderr).toContain('--help');
    }
  });

  it('exits 2 where the results file cannot be written', () => {
    const study = write('good.json', site);
    mkdirSync(path('folder'), { recursive: true });
    for (const out of [path('no/such/folder/out.json'), path('folder')]) {
      const { status, stderr } = runStudy(study, '--out', out);
      expect(status).toBe(2);
      expect(stderr).toContain('cannot be written');
    }
  });

  it('refuses to write the results over the study, also through a link', () => {
    const study = write('precious.json', site);
    symlinkSync(study, path('link.json'));
    for (const out of [study, path('link.json')]) {
      const { status, stderr } = runStudy(study, '--out', out);
      expect(status).toBe(2);
      expect(stderr).toContain('is the study itself');
    }
    expect(JSON.parse(readFileSync(study, 'utf8'))).toEqual(site);
  });
});

describe('--help', () => {
  it('shows how to call it, what the exit status means, and exits 0', () => {
    const { status, stdout } = runStudy('--help');
    expect(status).toBe(0);
    expect(stdout).toContain('--out');
    expect(stdout).toContain('--strict');
    expect(stdout).toMatch(/Exit status: 0 .* 1 .*2 /s);
  });
});
