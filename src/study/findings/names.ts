import { updateBus, updateElement } from '../edits/updates.ts';
import { nameOf } from '../names.ts';
import type { Bus, Study, StudyElement } from '../types.ts';
import { type Said, saidOfBus, saidOfPart } from './Said.ts';

/** Parts and busbars that drawing, notes and sheet cannot tell apart. */
export function nameFindings(study: Study): Said[] {
  const first = new Map<string, Bus | StudyElement>();
  const taken = new Set([...study.buses, ...study.elements].map((item) => spoken(nameOf(item))));
  return [...study.buses, ...study.elements].flatMap((item) => {
    const name = spoken(nameOf(item));
    if (!first.has(name)) {
      first.set(name, item);
      return [];
    }
    const free = freeName(nameOf(item), taken);
    taken.add(spoken(free));
    return [twice(study, item, free)];
  });
}

const spoken = (name: string): string => name.trim().toLowerCase();

/** "Pumps" becomes "Pumps 2", "T1" becomes "T2", or the next number nobody has. */
function freeName(name: string, taken: ReadonlySet<string>): string {
  const match = /^(.*?)(\d+)$/.exec(name);
  const stem = match?.[1] ?? `${name} `;
  let counter = match ? Number(match[2]) : 1;
  do counter += 1;
  while (taken.has(spoken(`${stem}${counter}`)));
  return `${stem}${counter}`;
}

function twice(study: Study, item: Bus | StudyElement, free: string): Said {
  const words = `rename ${nameOf(item)} to ${free}`;
  const said = {
    code: 'duplicate-name',
    severity: 'warning' as const,
    text: 'another part or busbar has the same name; notes and sheet cannot tell them apart',
    mend: words,
  };
  const rename = (current: Study) =>
    'kind' in item
      ? updateElement(current, item.id, { name: free })
      : updateBus(current, item.id, { name: free });
  const repair = { words, scope: words, make: rename };
  return 'kind' in item
    ? saidOfPart(item, 'name', { ...said, repair })
    : saidOfBus(study, item, 'name', { ...said, repair });
}
