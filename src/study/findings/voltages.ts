import { updateBus, updateElement } from '../edits/updates.ts';
import { busById, elementsAt, isOn, isSeries } from '../lookup.ts';
import { busName, fullNameOf, nameOf } from '../names.ts';
import type { Bus, SeriesElement, Study, Transformer } from '../types.ts';
import { type Repair, type Said, type State, saidOfPart } from './Said.ts';
import { volts } from './volts.ts';

/** Nominal and rated voltage may differ by this share before it is worth a word (study format, 5). */
const slack = 0.15;

const near = (rated: number, nominal: number): boolean => Math.abs(nominal - rated) <= slack * rated;

/** Series parts whose ends stand at voltages they do not belong to. */
export function voltageFindings({ here }: State): Said[] {
  return here.elements.flatMap((part): Said[] => {
    if (!isSeries(part)) return [];
    const [from, to] = [busById(here, part.from), busById(here, part.to)];
    if (!from || !to) return [];
    return part.kind === 'transformer' ? transformerSides(part, from, to) : unequalEnds(here, part, from, to);
  });
}

function transformerSides(part: Transformer, from: Bus, to: Bus): Said[] {
  const turned = near(part.lvV, from.nominalV) && near(part.hvV, to.nominalV) && part.hvV !== part.lvV;
  if (turned && !near(part.hvV, from.nominalV)) return [standsOnItsHead(part, from, to)];
  return [
    ...(near(part.hvV, from.nominalV) ? [] : [sideMismatch(part, 'hvV', from)]),
    ...(near(part.lvV, to.nominalV) ? [] : [sideMismatch(part, 'lvV', to)]),
  ];
}

function standsOnItsHead(part: Transformer, from: Bus, to: Bus): Said {
  const words = `turn ${fullNameOf(part)} round`;
  return saidOfPart(part, 'from', {
    code: 'transformer-turned',
    severity: 'error',
    text: `its ${volts(part.hvV)} side stands at busbar ${nameOf(from)} of ${volts(from.nominalV)} and its ${volts(part.lvV)} side at ${nameOf(to)} of ${volts(to.nominalV)}`,
    mend: `${words}, so that each side meets its voltage`,
    repair: {
      words,
      scope: `turn ${part.id}`,
      make: (study) => updateElement(study, part.id, { from: part.to, to: part.from }),
    },
  });
}

function sideMismatch(part: Transformer, side: 'hvV' | 'lvV', bus: Bus): Said {
  const rated = part[side];
  return saidOfPart(part, side, {
    code: 'voltage-mismatch',
    severity: 'error',
    text: `its ${side === 'hvV' ? 'upper' : 'lower'} side is rated ${volts(rated)} at busbar ${nameOf(bus)} of ${volts(bus.nominalV)} nominal, more than 15 % apart`,
    mend: 'correct the rated voltage or the busbar, or move this end to a busbar of its voltage',
  });
}

function unequalEnds(study: Study, part: SeriesElement, from: Bus, to: Bus): Said[] {
  if (from.nominalV === to.nominalV) return [];
  return [
    saidOfPart(part, 'to', {
      code: 'voltage-mismatch',
      severity: 'error',
      text: `joins busbar ${nameOf(from)} of ${volts(from.nominalV)} to ${nameOf(to)} of ${volts(to.nominalV)} nominal; it keeps the voltage, so both must have the same`,
      mend: 'correct the nominal voltage of one busbar, or put a transformer in its place',
      repair: sameVolts(study, part, from, to),
    }),
  ];
}

/** Where a transformer or source settles the volts of one busbar and nothing those of the other, it takes them. */
function sameVolts(study: Study, part: SeriesElement, from: Bus, to: Bus): Repair | undefined {
  const [settledFrom, settledTo] = [isSettled(study, from, part), isSettled(study, to, part)];
  if (settledFrom === settledTo) return undefined;
  const [right, wrong] = settledFrom ? [from, to] : [to, from];
  const words = `set the nominal voltage of ${busName(study, wrong.id)} to ${volts(right.nominalV)}`;
  return {
    words,
    scope: `volts ${wrong.id}`,
    make: (current) => updateBus(current, wrong.id, { nominalV: right.nominalV }),
  };
}

function isSettled(study: Study, bus: Bus, apart: SeriesElement): boolean {
  return elementsAt(study, bus.id).some((part) => {
    if (part.id === apart.id || !isOn(part)) return false;
    if (part.kind === 'supply' || part.kind === 'generator') return true;
    if (part.kind === 'transformer') return near(part.from === bus.id ? part.hvV : part.lvV, bus.nominalV);
    const other = isSeries(part) ? busById(study, part.from === bus.id ? part.to : part.from) : undefined;
    return other?.nominalV === bus.nominalV;
  });
}
