import { busesOf, isOn, isSeries } from '../lookup.ts';
import { fullNameOf } from '../names.ts';
import type { Bus, Study, StudyElement } from '../types.ts';
import { type Said, type State, saidOfBus, saidOfStudy, setFields } from './Said.ts';

const isSource = (element: StudyElement): boolean =>
  element.kind === 'supply' || element.kind === 'generator';

/** Ids of the busbars a source in service reaches. */
export function fedBuses(study: Study): Set<string> {
  const fed = new Set(
    study.elements.flatMap((element) => (isSource(element) && isOn(element) ? busesOf(element) : [])),
  );
  const joints = study.elements.filter(isSeries).filter(isOn);
  for (let size = -1; size !== fed.size; ) {
    size = fed.size;
    for (const { from, to } of joints) {
      if (fed.has(from)) fed.add(to);
      else if (fed.has(to)) fed.add(from);
    }
  }
  return fed;
}

/** A site without a source, and busbars no source reaches, with the parts in service there. */
export function feedingFindings(state: State): Said[] {
  const { here } = state;
  const fed = fedBuses(here);
  if (fed.size === 0) return [noSource(state)];
  return here.buses.filter((bus) => !fed.has(bus.id)).flatMap((bus) => unfed(state, bus, fed));
}

function noSource(state: State): Said {
  const idle = state.here.elements.filter(isSource);
  const [only] = idle;
  const words = only ? `put ${fullNameOf(only)} in service` : '';
  return {
    ...saidOfStudy(['elements'], {
      code: 'no-source',
      severity: 'error',
      text: 'nothing feeds the site, so nothing can be solved',
      mend: only
        ? `put a supply or generator in service, such as ${fullNameOf(only)}`
        : 'drop a supply on the busbar where the network operator feeds the site',
      repair: only && idle.length === 1 ? setFields(state, only.id, { on: undefined }, words) : undefined,
    }),
    ...(only ? { subject: { kind: 'element' as const, id: only.id }, field: 'on' } : {}),
  };
}

function unfed(state: State, bus: Bus, fed: ReadonlySet<string>): Said[] {
  const { here } = state;
  const waiting = here.elements.filter(
    (element) => isOn(element) && !isSeries(element) && busesOf(element).includes(bus.id),
  );
  // A case that leaves an empty busbar dead means to.
  if (waiting.length === 0 && fedBuses(state.base).has(bus.id)) return [];
  const open = joiningParts(here, bus.id, fed);
  const [only] = open;
  const words = only ? closeWords(only) : '';
  return [
    saidOfBus(here, bus, null, {
      code: 'unfed-bus',
      severity: waiting.length > 0 ? 'warning' : 'note',
      text: `no source in service reaches it${notSupplied(waiting)}`,
      mend: only
        ? `${words}, or connect it otherwise`
        : 'connect it by a transformer, cable or coupler, or remove it',
      repair: only && open.length === 1 ? setFields(state, only.id, { on: undefined }, words) : undefined,
    }),
  ];
}

function closeWords(part: StudyElement): string {
  return part.kind === 'coupler' ? `close ${fullNameOf(part)}` : `put ${fullNameOf(part)} in service`;
}

/** Parts out of service that would join the dead busbar, or what hangs together with it, to a live one. */
function joiningParts(study: Study, dead: string, fed: ReadonlySet<string>): StudyElement[] {
  const joints = study.elements.filter(isSeries);
  const island = new Set([dead]);
  for (const bus of island) {
    for (const { from, to } of joints.filter(isOn)) {
      if (from === bus) island.add(to);
      if (to === bus) island.add(from);
    }
  }
  return joints.filter(
    (part) =>
      !isOn(part) &&
      ((island.has(part.from) && fed.has(part.to)) || (island.has(part.to) && fed.has(part.from))),
  );
}

const namedAtMost = 3;

function notSupplied(parts: readonly StudyElement[]): string {
  if (parts.length === 0) return '';
  const names = parts.slice(0, namedAtMost).map(fullNameOf).join(', ');
  const more = parts.length - namedAtMost;
  return `; not supplied there: ${names}${more > 0 ? ` and ${more} more` : ''}`;
}
