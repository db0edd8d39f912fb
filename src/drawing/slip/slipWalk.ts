type Control = HTMLInputElement | HTMLSelectElement;

/** Where Enter leads: to a control, or out of the slip; null where there is no way on. */
export type NextStop = Control | 'close' | null;

const controls = 'input:not([disabled]), select:not([disabled])';

/**
 * The way of the Enter key through a slip: name, then the essential fields; inside the fold of further data
 * from field to field; past the last one out of the slip. Inside a field of several controls (steps, rows,
 * origin) it goes to the next of them first. Shift goes back.
 */
export function nextStop(paper: HTMLElement, from: Element, back: boolean): NextStop {
  const row = from.closest<HTMLElement>('.slip-row');
  const own = row && controlOf(row);
  if (row && own !== from) {
    const inside = visible(row);
    const beside = inside[inside.indexOf(from as Control) + (back ? -1 : 1)];
    if (beside) return beside;
  }
  const fold = from.closest<HTMLElement>('.slip-more');
  const name = paper.querySelector<Control>('.slip-name');
  const essential = stopsIn(paper.querySelector('.slip-essentials'));
  const stops = fold ? stopsIn(fold) : name ? [name, ...essential] : essential;
  const at = own ? stops.indexOf(own) : stops.indexOf(from as Control);
  // A field whose own control is a button is no stop; its inner controls lead on to the field after it.
  const next = at >= 0 ? stops[at + (back ? -1 : 1)] : after(stops, from, back);
  if (next) return next;
  if (!back) return 'close';
  return fold ? (essential.at(-1) ?? name) : null;
}

function after(stops: readonly Control[], from: Element, back: boolean): Control | undefined {
  const follows = (stop: Control) =>
    (from.compareDocumentPosition(stop) & Node.DOCUMENT_POSITION_FOLLOWING) !== 0;
  return back ? stops.findLast((stop) => !follows(stop)) : stops.find(follows);
}

/** The control a row's label points to, unless it is a button. */
function controlOf(row: HTMLElement): Control | null {
  const control = row.querySelector('label')?.control;
  return control instanceof HTMLInputElement || control instanceof HTMLSelectElement ? control : null;
}

function stopsIn(part: HTMLElement | null): Control[] {
  const rows = [...(part?.querySelectorAll<HTMLElement>('.slip-row') ?? [])];
  return rows.flatMap((row) => controlOf(row) ?? []).filter((control) => control.offsetParent !== null);
}

function visible(row: HTMLElement): Control[] {
  return [...row.querySelectorAll<Control>(controls)].filter((control) => control.offsetParent !== null);
}
