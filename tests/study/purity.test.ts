import { describe, expect, it, vi } from 'vitest';

vi.mock('react', () => ({}));
vi.mock('react-dom', () => ({}));

describe('The study layer', () => {
  it('works with React and the DOM absent', async () => {
    expect('document' in globalThis).toBe(false);
    const { addBus, checkStudy, newStudy } = await import('../../src/study/index.ts');
    const study = addBus(newStudy()).apply(newStudy());
    expect(checkStudy(study).study).toBe(study);
  });
});
