import type { Transformer } from '../study/index.ts';
import { busById, isOn, nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure, ordinal } from './figure.ts';
import { galvanic } from './galvanic.ts';
import { partRow } from './partRow.ts';
import type { Verdict } from './types.ts';
import { judged, keptQuietly } from './verdict.ts';

/** Inrush of a transformer is rich in the orders from here to LIMIT, even ones among them. */
const LOWEST = 2;
const LIMIT = 4;
const POINTS = 81;

/**
 * Screening (energising): no parallel resonance at order 2 to 4 on a busbar with correction from which a
 * transformer is energised, that transformer itself out; its inrush would feed it for seconds. Nothing is
 * said of transformers on busbars without correction.
 */
export function energising(context: CheckContext): Verdict[] {
  const { study } = context;
  return study.elements.flatMap((part) => {
    if (part.kind !== 'transformer' || !isOn(part) || !context.solved.energised(part.from)) return [];
    const reach = galvanic(study, part.from);
    const corrected = study.elements.some(
      (other) => 'bus' in other && context.correction.has(other.id) && reach.has(other.bus),
    );
    return corrected ? atTransformer(context, part) : [];
  });
}

function atTransformer(context: CheckContext, transformer: Transformer): Verdict[] {
  const fn = context.study.frequencyHz;
  const span = {
    bus: transformer.from,
    sequence: 'positive' as const,
    // A little beyond both ends, so that a peak on an end is seen as one.
    fromHz: 0.95 * LOWEST * fn,
    toHz: 2 * LIMIT * fn,
    points: POINTS,
  };
  const scan = context.scan(span, new Set([transformer.id]));
  const row = partRow(context, transformer.id, {
    check: 'energising',
    title: 'resonance while the transformer is energised',
    unit: 'h',
    part: 'peak',
  });
  row.screening = true;
  row.remarks = ['Screening only: how long and how high it rings needs a study of the inrush.'];
  // Fed through this very transformer, the busbar is dead without it: it is energised from its other side.
  if (scan.error !== undefined) return [];
  const peaks = scan.resonances.filter(({ kind, order }) => kind === 'parallel' && order >= LOWEST);
  const [lowest] = peaks.map(({ order }) => order).sort((a, b) => a - b);
  if (lowest === undefined)
    return [keptQuietly(row, 'No parallel resonance is seen up to the 8th.', null, LIMIT)];
  const place = nameOf(busById(context.study, transformer.from) ?? { id: transformer.from });
  return [
    judged({
      ...row,
      order: lowest,
      value: lowest,
      limit: LIMIT,
      sense: 'lower',
      working: [
        {
          equation: 'lowest parallel resonance h_r, transformer out, against orders 2 to 4',
          numbers: `h_r = ${figure(lowest)} at ${place}`,
        },
      ],
      mend: `Take the correction at ${place} off while ${nameOf(transformer)} is energised; its inrush carries the ${ordinal(Math.max(LOWEST, Math.round(lowest)))} for seconds.`,
    }),
  ];
}
