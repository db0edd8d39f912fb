/** The sample sites in public/samples, by their story. */
export interface Sample {
  id: string;
  title: string;
  story: string;
}

export const samples: readonly Sample[] = [
  {
    id: 'cold-store',
    title: 'Brackwater cold store',
    story: '50 Hz. A plain bank that is clear with every step on, and meets the 11th with two of three.',
  },
  {
    id: 'office-tower',
    title: 'Harrow Lane offices',
    story: '60 Hz. Four-wire electronic loads: the neutral carries more than its phases.',
  },
  {
    id: 'waterworks',
    title: 'Tarnwell waterworks',
    story:
      '50 Hz. Two boards coupled on one transformer: an old plain bank beside a detuned one meets the 11th.',
  },
];

export function sampleFile(sample: Sample): string {
  return `${sample.id}.json`;
}
