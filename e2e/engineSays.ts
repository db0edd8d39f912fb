import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { drivingPoints, scanImpedance, solveCase, terminalReading } from '../src/engine/index.ts';
import { readStudy, type Study } from '../src/study/index.ts';

/** A study from a file's text; throws with the findings where it is refused. */
export function studyFrom(text: string): Study {
  const { study, findings } = readStudy(text);
  if (!study) throw new Error(findings.map((finding) => finding.message).join('\n'));
  return study;
}

export function sampleText(id: string): string {
  return readFileSync(resolve(import.meta.dirname, `../public/samples/${id}.json`), 'utf8');
}

/** cos φ of a part's current at one of its busbars, as the engine computes it here in Node. */
export function cosPhi(study: Study, caseId: string, element: string, bus: string): number {
  const solution = solveCase(study, caseId);
  const at = solution.terminals.findIndex((one) => one.element === element && one.bus === bus);
  const pf = terminalReading(solution, at).displacementPF;
  if (pf === null) throw new Error(`no current into ${element} at ${bus}`);
  return Math.abs(pf);
}

/** Active power a source delivers to a busbar, kW. */
export function deliveredKW(study: Study, caseId: string, source: string, bus: string): number {
  const solution = solveCase(study, caseId);
  const at = solution.terminals.findIndex((one) => one.element === source && one.bus === bus);
  return -terminalReading(solution, at).kW;
}

/** Order of the strongest parallel resonance seen from a busbar. */
export function parallelOrder(study: Study, caseId: string, bus: string): number {
  const { frequencyHz, maxOrder = 50 } = study;
  const { resonances } = scanImpedance(study, caseId, {
    bus,
    sequence: 'positive',
    fromHz: 0.5 * frequencyHz,
    toHz: maxOrder * frequencyHz,
    points: 4000,
  });
  const [first] = resonances.filter((one) => one.kind === 'parallel').sort((a, b) => b.ohm - a.ohm);
  if (!first) throw new Error(`no parallel resonance at ${bus}`);
  return first.order;
}

/** |Z| at a busbar at one real order, ohm per phase. */
export function impedanceOhm(study: Study, caseId: string, bus: string, order: number): number {
  const points = drivingPoints(study, caseId, order);
  const at = study.buses.findIndex((one) => one.id === bus);
  return Math.hypot(points.re[at] ?? Number.NaN, points.im[at] ?? Number.NaN);
}
