import type { Edit, Pin, Study } from '../study/index.ts';

/** Whether two pins watch the same quantity. */
export function samePin(a: Pin, b: Pin): boolean {
  if (a.quantity === 'voltage') return b.quantity === 'voltage' && a.bus === b.bus;
  return b.quantity === 'current' && a.element === b.element && a.bus === b.bus;
}

/** Pins a quantity, or unpins it where it is pinned already. */
export function togglePinEdit(study: Study, pin: Pin): Edit {
  const pins = study.view?.pins ?? [];
  const pinned = pins.some((other) => samePin(other, pin));
  return {
    label: pinned ? 'view.unpin' : 'view.pin',
    words: `${pinned ? 'unpin' : 'pin'} ${pinWords(study, pin)}`,
    apply: (now) => {
      const others = (now.view?.pins ?? []).filter((other) => !samePin(other, pin));
      return { ...now, view: { ...now.view, pins: pinned ? others : [...others, pin] } };
    },
  };
}

function pinWords(study: Study, pin: Pin): string {
  const bus = study.buses.find((other) => other.id === pin.bus);
  const busName = bus?.name ?? pin.bus;
  if (pin.quantity === 'voltage') return `the voltage of ${busName}`;
  const element = study.elements.find((other) => other.id === pin.element);
  return `the current into ${element?.name ?? pin.element}`;
}
