import type { Slice } from './slice.ts';

/** A slice put on a page; y from the upper edge of the room for text. */
export interface PlacedSlice {
  slice: Slice;
  y: number;
}

/** Slices that must stay on one page. */
function chainsOf(slices: readonly Slice[]): Slice[][] {
  const chains: Slice[][] = [];
  let open = false;
  for (const slice of slices) {
    const last = chains.at(-1);
    if (open && last) last.push(slice);
    else chains.push([slice]);
    open = slice.glued;
  }
  return chains;
}

/**
 * Fills pages with slices in order. `room(page)` is the height left for text on a page, counted from 0.
 * A chain of glued slices moves to the next page as a whole, except where it alone is higher than a page.
 * Where a table goes on at the head of a page, its column heads are repeated there.
 */
export function paginate(slices: readonly Slice[], room: (page: number) => number): PlacedSlice[][] {
  const pages: PlacedSlice[][] = [[]];
  let y = 0;
  const turn = (): void => {
    pages.push([]);
    y = 0;
  };
  const put = (slice: Slice): void => {
    const page = pages.at(-1);
    if (!page) return;
    if (page.length > 0) y += slice.gap ?? 0;
    if (page.length === 0 && slice.repeat) {
      page.push({ slice: slice.repeat, y: 0 });
      y = slice.repeat.height;
    }
    page.push({ slice, y });
    y += slice.height;
  };
  const fits = (chain: readonly Slice[]): boolean => {
    const begun = (pages.at(-1)?.length ?? 0) > 0;
    const height = chain.reduce(
      (sum, slice, index) => sum + slice.height + (begun || index > 0 ? (slice.gap ?? 0) : 0),
      0,
    );
    return y + height <= room(pages.length - 1) + 0.01;
  };
  for (const chain of chainsOf(slices)) {
    if (fits(chain)) {
      chain.forEach(put);
      continue;
    }
    if ((pages.at(-1)?.length ?? 0) > 0) turn();
    for (const slice of chain) {
      if (!fits([slice]) && (pages.at(-1)?.length ?? 0) > 0) turn();
      put(slice);
    }
  }
  return pages;
}
