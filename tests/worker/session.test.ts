import { describe, expect, it } from 'vitest';
import { judgeCase } from '../../src/checks/index.ts';
import { type CaseSolution, correctionParts, solveCase, solveStudy } from '../../src/engine/index.ts';
import { defaultFamilies, defaultTolerances, statesOf, worstOver } from '../../src/sizing/index.ts';
import { baseStateId, casesOf, type Study } from '../../src/study/index.ts';
import type { Job, Replies, ReplyMessage } from '../../src/worker/protocol.ts';
import { createSession } from '../../src/worker/session.ts';
import { transferables } from '../../src/worker/transferables.ts';
import { site } from '../store/site.ts';

/** A session behind a boundary like the worker's: what it answers is transferred away from it. */
function behindBoundary() {
  const session = createSession();
  let id = 0;
  function send<K extends Job['kind']>(
    job: Extract<Job, { kind: K }>,
    revision = 1,
    study?: Study,
  ): Replies[K] | { failed: string } {
    id += 1;
    const message = { id, revision, job, ...(study ? { study: structuredClone(study) } : {}) };
    const reply = session.handle(structuredClone(message));
    const received: ReplyMessage = structuredClone(reply, { transfer: transferables(reply) });
    expect(received.id).toBe(id);
    return 'failed' in received ? { failed: received.failed } : (received.reply as Replies[K]);
  }
  return { send };
}

function good<T extends object>(reply: T | { failed: string }): T {
  if ('failed' in reply) throw new Error(reply.failed);
  return reply;
}

const magnitude = (re: number | undefined, im: number | undefined): number =>
  Math.hypot(re ?? Number.NaN, im ?? Number.NaN);

describe('the session in the worker', () => {
  it('answers the case as it stands and without banks and filters, as the engine solves them', () => {
    const { send } = behindBoundary();
    const numbers = good(send({ kind: 'solve', caseId: 'day' }, 1, site));
    expect(numbers.solution).toEqual(solveCase(site, 'day'));
    expect(numbers.without).toEqual(solveCase(site, 'day', { without: correctionParts(site) }));
    expect(numbers.without.terminals.some(({ element }) => element === 'c1')).toBe(false);
  });

  it('judges a case the same before and after its numbers have left the worker', () => {
    const { send } = behindBoundary();
    const others: CaseSolution[] = casesOf(site).map(({ id }) => solveCase(site, id));
    const expected = judgeCase(site, solveCase(site, 'day'), { otherCases: others });
    expect(good(send({ kind: 'judge', caseId: 'day', screening: true }, 1, site))).toEqual(expected);
    send({ kind: 'solve', caseId: 'day' });
    expect(good(send({ kind: 'judge', caseId: 'day', screening: true }))).toEqual(expected);
    expect(expected.length).toBeGreaterThan(0);
  });

  it('looks for the worst slice by slice, other requests in between, and ends as in one go', () => {
    const { send } = behindBoundary();
    const question = { families: defaultFamilies, tolerances: defaultTolerances };
    let slice = good(send({ kind: 'worst', question }, 1, site));
    let slices = 1;
    while (slice.state === 'running') {
      expect(slice.progress.done).toBeLessThanOrEqual(slice.progress.total);
      good(send({ kind: 'solve', caseId: 'day' }));
      slice = good(send({ kind: 'worst', question }));
      slices += 1;
    }
    const states = statesOf(site, defaultFamilies).states ?? [];
    const whole = worstOver(site, { states, tolerances: defaultTolerances });
    let next = whole.next();
    while (!next.done) next = whole.next();
    expect(slice).toEqual({ state: 'done', result: next.value });
    expect(slices).toBeGreaterThan(1);
  });

  it('draws the band of a busbar, again as often as it is asked', () => {
    const { send } = behindBoundary();
    const question = { families: defaultFamilies, tolerances: defaultTolerances };
    const bus = site.buses[0]?.id ?? '';
    const whole = () => {
      let slice = good(send({ kind: 'envelope', bus, question }, 1, site));
      while (slice.state === 'running') slice = good(send({ kind: 'envelope', bus, question }));
      return slice.result;
    };
    const band = whole();
    expect(band?.bus).toBe(bus);
    expect(band?.highOhm.length).toBeGreaterThan(200);
    expect(band?.highOhm.every((high, k) => high >= (band.lowOhm[k] ?? Number.NaN))).toBe(true);
    expect(whole()).toEqual(band);
  });

  it('counts states that are too many instead of solving some of them', () => {
    const { send } = behindBoundary();
    const bank = site.elements.find((part) => part.kind === 'bank');
    const steps = Array.from({ length: 12 }, (_, k) => ({ kvar: 2 ** k }));
    const many = {
      ...site,
      elements: site.elements.map((part) => (part === bank ? { ...part, steps } : part)),
    };
    const question = { families: defaultFamilies, tolerances: null };
    const slice = good(send({ kind: 'worst', question }, 1, many as Study));
    expect(slice.state).toBe('too-many');
    expect(slice.state === 'too-many' && slice.count).toBeGreaterThan(2000);
  });

  it('judges all but the screening rows when asked to be quick', () => {
    const { send } = behindBoundary();
    const all = good(send({ kind: 'judge', caseId: 'day', screening: true }, 1, site));
    const quick = good(send({ kind: 'judge', caseId: 'day', screening: false }));
    expect(quick).toEqual(all.filter(({ screening }) => !screening));
    expect(quick.length).toBeLessThan(all.length);
  });

  it('keeps nothing of an older revision', () => {
    const { send } = behindBoundary();
    send({ kind: 'solve', caseId: 'day' }, 1, site);
    send({ kind: 'judge', caseId: 'day', screening: true });
    const edited: Study = {
      ...site,
      elements: site.elements.map((part) =>
        part.kind === 'bank' ? { ...part, steps: [{ kvar: 10 }] } : part,
      ),
    };
    const { solution } = good(send({ kind: 'solve', caseId: 'day' }, 2, edited));
    expect(solution).toEqual(solveCase(edited, 'day'));
    const others = casesOf(edited).map(({ id }) => solveCase(edited, id));
    expect(good(send({ kind: 'judge', caseId: 'day', screening: true }, 2))).toEqual(
      judgeCase(edited, solveCase(edited, 'day'), { otherCases: others }),
    );
  });

  it('refuses a revision it does not hold, and a case or busbar the study lacks, and lives on', () => {
    const { send } = behindBoundary();
    expect(send({ kind: 'solve', caseId: 'day' }, 7)).toMatchObject({ failed: expect.stringContaining('7') });
    expect(send({ kind: 'solve', caseId: 'weekend' }, 1, site)).toMatchObject({
      failed: expect.stringContaining('weekend'),
    });
    expect(send({ kind: 'scan', caseId: 'day', focusBus: 'roof' })).toMatchObject({
      failed: expect.stringContaining('roof'),
    });
    expect(good(send({ kind: 'solve', caseId: 'day' })).solution.converged).toBe(true);
  });

  it('gives the whole results file with the checks of every case', () => {
    const { send } = behindBoundary();
    const { cases } = good(send({ kind: 'results' }, 1, site));
    expect(cases.map(({ buses, terminals }) => ({ buses, terminals }))).toEqual(
      solveStudy(site).cases.map(({ buses, terminals }) => ({ buses, terminals })),
    );
    expect(cases.every(({ checks }) => checks.length > 0)).toBe(true);
  });

  it('gives a dossier of a case with a curve for every busbar asked for', () => {
    const { send } = behindBoundary();
    const dossier = good(send({ kind: 'dossier', caseId: 'night', buses: ['in', 'main'] }, 1, site));
    expect(dossier.scans.map(({ bus }) => bus)).toEqual(['in', 'main']);
    expect(dossier.solution).toEqual(solveCase(site, 'night'));
    expect(dossier.verdicts.every(({ caseId }) => caseId === 'night')).toBe(true);
  });

  it('gives a dossier of the base study although no case is in its state', () => {
    const { send } = behindBoundary();
    const cases = casesOf(site).filter(({ changes }) => changes.length > 0);
    const study: Study = { ...site, cases };
    const dossier = good(send({ kind: 'dossier', caseId: baseStateId, buses: ['main'] }, 1, study));
    expect(dossier.solution.converged).toBe(true);
    expect(dossier.solution.voltage).toEqual(solveCase(site, 'day').voltage);
    expect(dossier.verdicts.length).toBeGreaterThan(0);
    expect(dossier.verdicts.every(({ caseId }) => caseId === baseStateId)).toBe(true);
    const known = cases[0]?.id ?? '';
    expect(good(send({ kind: 'judge', caseId: known, screening: true }))).toEqual(
      judgeCase(study, solveCase(study, known), { otherCases: cases.map(({ id }) => solveCase(study, id)) }),
    );
  });

  it('warms up on its own site without a study', () => {
    const { send } = behindBoundary();
    expect(good(send({ kind: 'warm' }))).toEqual({ hot: false });
  });
});

describe('the curves of the rail', () => {
  const { send } = behindBoundary();
  const pair = good(send({ kind: 'scan', caseId: 'day', focusBus: 'main' }, 1, site));
  const { frequencyHz, re, im, resonances } = pair.with;

  it('run from half the fundamental to the highest order on one rising axis with every integer order', () => {
    expect(frequencyHz[0]).toBe(25);
    expect(frequencyHz.at(-1)).toBe(13 * 50);
    expect(pair.without.frequencyHz).toEqual(frequencyHz);
    for (let i = 1; i < frequencyHz.length; i += 1) {
      expect(frequencyHz[i]).toBeGreaterThan(frequencyHz[i - 1] as number);
    }
    for (let h = 1; h <= 13; h += 1) expect(frequencyHz).toContain(h * 50);
  });

  it('are drawn to the tip of each peak', () => {
    const parallel = resonances.find(({ kind }) => kind === 'parallel');
    expect(parallel).toBeDefined();
    const highest = Math.max(...re.map((value, i) => magnitude(value, im[i])));
    expect(highest / (parallel?.ohm ?? 0)).toBeCloseTo(1, 6);
  });

  it('agree with the driving-point impedance probed at the same order', () => {
    for (const order of [1, 5, 7]) {
      const probe = good(send({ kind: 'probe', caseId: 'day', order }));
      const bus = probe.buses.indexOf('main');
      const i = frequencyHz.indexOf(order * 50);
      expect(probe.with.present[bus]).toBe(1);
      expect(magnitude(re[i], im[i]) / magnitude(probe.with.re[bus], probe.with.im[bus])).toBeCloseTo(1, 9);
      const bare = magnitude(pair.without.re[i], pair.without.im[i]);
      expect(bare / magnitude(probe.without.re[bus], probe.without.im[bus])).toBeCloseTo(1, 9);
    }
  });

  it('carry the reason where a busbar has no source', () => {
    const dark: Study = { ...site, buses: [...site.buses, { id: 'spare', nominalV: 400 }] };
    const scan = good(behindBoundary().send({ kind: 'scan', caseId: 'day', focusBus: 'spare' }, 1, dark));
    expect(scan.with.error).toContain('no path to a source');
    expect(scan.with.frequencyHz).toHaveLength(0);
  });
});
