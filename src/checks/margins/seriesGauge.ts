import type { Cable, Transformer } from '../../study/index.ts';
import { isOn } from '../../study/index.ts';
import type { CheckContext } from '../CheckContext.ts';
import { cableDesignAmperes } from '../cableLoad.ts';
import { transformerUse } from '../transformerLoad.ts';
import { type Gauge, NOT_FORMED } from './Gauge.ts';

/** Loading of transformers and of cables with a rating. */
export function seriesGauges(context: CheckContext): Gauge[] {
  return context.study.elements.flatMap((part) => {
    if (part.kind === 'transformer' && isOn(part)) return [transformerGauge(part)];
    if (part.kind === 'cable' && isOn(part) && part.ratedA !== undefined)
      return [cableGauge(part, part.ratedA)];
    return [];
  });
}

function transformerGauge(part: Transformer): Gauge {
  return {
    measures: [
      {
        key: `transformer-load|${part.id}`,
        check: 'transformer-load',
        subject: { kind: 'element', id: part.id },
      },
    ],
    read({ solved }, out, at) {
      const use = transformerUse(solved, part);
      out[at] = use === null ? NOT_FORMED : 1 - use;
    },
  };
}

function cableGauge(part: Cable, ratedA: number): Gauge {
  return {
    measures: [
      { key: `cable-load|${part.id}`, check: 'cable-load', subject: { kind: 'element', id: part.id } },
    ],
    read({ solved }, out, at) {
      const designA = cableDesignAmperes(solved, part)?.designA;
      out[at] = designA === undefined ? NOT_FORMED : 1 - designA / ratedA;
    },
  };
}
