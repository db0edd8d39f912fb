import type { Study } from '../study/index.ts';
import { elementsAt, isOn, isSeries } from '../study/index.ts';

/** Ids of the busbars joined to one, itself included, without a transformer between them. */
export function galvanic(study: Study, start: string): Set<string> {
  const reached = new Set<string>();
  const queue = [start];
  for (let id = queue.pop(); id !== undefined; id = queue.pop()) {
    if (reached.has(id)) continue;
    reached.add(id);
    for (const part of elementsAt(study, id)) {
      if (isOn(part) && isSeries(part) && part.kind !== 'transformer')
        queue.push(part.from === id ? part.to : part.from);
    }
  }
  return reached;
}
