import { freshId } from './freshId.ts';

const key = 'varwright-slot';

/** The tab's place on the shelf: the same after a reload, another one in another tab. */
export function tabSlot(): { slot: () => string; takeFresh: () => void } {
  let slot = read() ?? freshId();
  write(slot);
  return {
    slot: () => slot,
    takeFresh: () => {
      slot = freshId();
      write(slot);
    },
  };
}

// Session storage may be forbidden; the tab then starts from the newest kept study after a reload.
function read(): string | null {
  try {
    return sessionStorage.getItem(key);
  } catch {
    return null;
  }
}

function write(slot: string): void {
  try {
    sessionStorage.setItem(key, slot);
  } catch {
    // Nothing to do: see above.
  }
}
