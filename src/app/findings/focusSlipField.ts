/** A slip is placed, shown and takes the focus to its first field over some frames; the field is asked for as long. */
const framesToWait = 30;
/** Frames after which the slip leaves the focus where it is. */
const settled = 2;

/** Puts the keyboard into a field of the slip that is about to open, unfolding what hides it. */
export function focusSlipField(field: string): void {
  let held = 0;
  const take = (left: number) => {
    const control = document.querySelector<HTMLElement>(`.slip [id$="-${CSS.escape(field)}"]`);
    const fold = control?.closest('details');
    if (fold && !fold.open) fold.open = true;
    if (control && document.activeElement === control) held += 1;
    else {
      held = 0;
      control?.focus();
      control?.scrollIntoView({ block: 'nearest' });
    }
    if (left > 0 && held < settled) requestAnimationFrame(() => take(left - 1));
  };
  requestAnimationFrame(() => take(framesToWait));
}
