import type { Bus, Finding, StudyElement, Transformer } from '../types.ts';
import { parseVectorGroup } from '../vectorGroup.ts';
import { findingOf, type Issue, warningIssue } from './issue.ts';
import { wordsFor } from './recordWords.ts';

/** Nominal and rated voltage may differ by this share before it is worth a warning. */
const voltageSlack = 0.15;

/** Voltages that do not belong together, and transformers of different shift between the same busbars. */
export function networkWarnings(elements: readonly StudyElement[], buses: readonly Bus[]): Finding[] {
  const volts = new Map(buses.map((bus) => [bus.id, bus.nominalV]));
  const findings = elements.flatMap((element, index) =>
    voltageWarnings(element, volts).map((issue) =>
      findingOf(issue, wordsFor('part', element, index), ['elements', index]),
    ),
  );
  return [...findings, ...shiftWarnings(elements)];
}

function voltageWarnings(element: StudyElement, volts: ReadonlyMap<string, number>): Issue[] {
  if (!('from' in element)) return [];
  const from = volts.get(element.from);
  const to = volts.get(element.to);
  if (from === undefined || to === undefined) return [];
  if (element.kind === 'transformer') {
    return [
      ...ratedVoltage('hvV', element.hvV, element.from, from),
      ...ratedVoltage('lvV', element.lvV, element.to, to),
    ];
  }
  if (from === to) return [];
  return [
    warningIssue(
      'voltage-mismatch',
      ['to'],
      element.to,
      `joins busbars of ${from} V and ${to} V nominal; it keeps the voltage, so both should have the same`,
    ),
  ];
}

function ratedVoltage(key: 'hvV' | 'lvV', rated: number, busId: string, nominal: number): Issue[] {
  if (Math.abs(nominal - rated) <= voltageSlack * rated) return [];
  return [
    warningIssue(
      'voltage-mismatch',
      [key],
      rated,
      `is rated ${rated} V at busbar "${busId}" of ${nominal} V nominal, more than 15 % apart; correct one of them`,
    ),
  ];
}

function shiftWarnings(elements: readonly StudyElement[]): Finding[] {
  const first = new Map<string, { transformer: Transformer; clock: number }>();
  return elements.flatMap((element, index): Finding[] => {
    if (element.kind !== 'transformer') return [];
    const group = parseVectorGroup(element.vectorGroup);
    if (typeof group === 'string') return [];
    const key = JSON.stringify([element.from, element.to]);
    const earlier = first.get(key);
    if (!earlier) {
      first.set(key, { transformer: element, clock: group.clock });
      return [];
    }
    if (earlier.clock === group.clock || element.on === false || earlier.transformer.on === false) return [];
    const text = `stands in parallel with ${wordsFor('part', earlier.transformer, 0)} (${earlier.transformer.vectorGroup}) with another shift; a circulating current flows`;
    return [
      findingOf(
        warningIssue('phase-shift', ['vectorGroup'], element.vectorGroup, text),
        wordsFor('part', element, index),
        ['elements', index],
      ),
    ];
  });
}
