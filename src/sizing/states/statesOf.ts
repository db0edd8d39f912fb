import type { CaseChange, ResolvedCase, Study } from '../../study/index.ts';
import { casesOf, isOn, isSeries, studyInCase } from '../../study/index.ts';
import { type Alternative, alternativesOf } from './alternatives.ts';
import { MOST_STATES, type StateFamilies } from './StateFamilies.ts';
import type { StudyState } from './StudyState.ts';

export interface StateSet {
  /** How many states the families make; above MOST_STATES counted before those are left out that are none. */
  count: number;
  /** All of them, the cases themselves first; null above MOST_STATES. */
  states: StudyState[] | null;
}

/**
 * The operating states of a study: every case times every choice of every family. None is dropped but those
 * that are no state at all: a transformer taken out whose busbars nothing else feeds. RangeError for a case
 * the study does not have.
 */
export function statesOf(study: Study, families: StateFamilies): StateSet {
  const cases = casesOf(study).filter(({ id }) => families.cases?.includes(id) ?? true);
  for (const id of families.cases ?? []) studyInCase(study, id);
  const choices = cases.map((item) => ({
    item,
    lists: alternativesOf(studyInCase(study, item.id), families),
  }));
  const count = choices.reduce(
    (sum, { lists }) => sum + lists.reduce((product, list) => product * list.length, 1),
    0,
  );
  if (count > MOST_STATES) return { count, states: null };
  const states = choices.flatMap(({ item, lists }) => combined(study, item, lists));
  return { count: states.length, states: states.sort((a, b) => a.words.length - b.words.length) };
}

/** The study with a state as a case of its own, named by the state's id, beside its other cases. */
export function studyInState(study: Study, state: StudyState): Study {
  const { from, words, stepsMoved, ...item } = state;
  if (words.length === 0) return study;
  return { ...study, cases: [...casesOf(study), item] };
}

function combined(study: Study, item: ResolvedCase, lists: readonly Alternative[][]): StudyState[] {
  let rows: Alternative[][] = [[]];
  for (const list of lists) rows = rows.flatMap((row) => list.map((choice) => [...row, choice]));
  return rows.flatMap((row) => {
    const state = stateFrom(item, row);
    return row.some(({ out }) => out !== undefined && leavesUnfed(study, state, out)) ? [] : [state];
  });
}

function stateFrom(item: ResolvedCase, row: readonly Alternative[]): StudyState {
  const words = row.flatMap(({ words: said }) => (said === '' ? [] : [said]));
  const role = row.findLast((choice) => choice.role !== undefined)?.role ?? item.role;
  return {
    id: words.length === 0 ? item.id : `${item.id} · ${words.join(' · ')}`,
    name: [item.name, ...words].join(', '),
    role,
    hoursPerDay: item.hoursPerDay,
    changes: [...item.changes, ...row.flatMap(({ changes }): CaseChange[] => changes)],
    from: item.id,
    words,
    stepsMoved: row.some(({ changes }) => changes.some(({ set }) => 'steps' in set)),
  };
}

/** Whether a busbar has no source in the state that would have one with the transformer in. */
function leavesUnfed(study: Study, state: StudyState, transformer: string): boolean {
  const inState = studyInCase(studyInState(study, state), state.id);
  const now = fedBuses(inState);
  const whole = inState.elements.map((part) => (part.id === transformer ? { ...part, on: true } : part));
  return [...fedBuses({ ...inState, elements: whole })].some((bus) => !now.has(bus));
}

function fedBuses({ elements }: Study): Set<string> {
  const on = elements.filter(isOn);
  const fed = new Set<string>();
  const queue = on.flatMap((part) => (part.kind === 'supply' || part.kind === 'generator' ? [part.bus] : []));
  for (let bus = queue.pop(); bus !== undefined; bus = queue.pop()) {
    if (fed.has(bus)) continue;
    fed.add(bus);
    for (const part of on)
      if (isSeries(part) && (part.from === bus || part.to === bus))
        queue.push(part.from === bus ? part.to : part.from);
  }
  return fed;
}
