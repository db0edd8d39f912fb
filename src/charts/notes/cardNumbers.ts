import type { Reading } from './Reading.ts';
import type { ReadingNumber } from './readingNumbers.ts';

export type ReadingFace = 'course' | 'spectrum';

/** The figure beside a reading's title: rms of the pinned quantity. */
export function headNumber(numbers: readonly ReadingNumber[]): ReadingNumber | undefined {
  return numbers.find(({ label }) => label === 'I' || label === 'U');
}

const KEY = new Set(['cos φ', 'PF', 'THD(I)', 'THD(U)']);

/**
 * The few figures a card writes under its picture; all of them stand in the lens. The spectrum says its THD
 * itself.
 */
export function cardNumbers(
  { pin }: Pick<Reading, 'pin'>,
  numbers: readonly ReadingNumber[],
  face: ReadingFace,
): ReadingNumber[] {
  return numbers.filter(
    ({ label }) =>
      KEY.has(label) && (face === 'course' || (pin.quantity === 'current' && label !== 'THD(I)')),
  );
}
