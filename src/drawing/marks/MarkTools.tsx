import { type MarkKind, markKinds } from '../../study/index.ts';
import { markWords } from './markWords.ts';

const ICONS: Record<MarkKind, string> = {
  note: 'M3,3v10M6.5,5h7M6.5,8h7M6.5,11h4',
  cloud:
    'M4,12a2.6,2.6 0 0 1 -0.4,-5.1a2.8,2.8 0 0 1 4,-2.6a3.1,3.1 0 0 1 5.2,2.2a2.8,2.8 0 0 1 -0.8,5.5a2,2 0 0 1 -2.8,0.4a2.2,2.2 0 0 1 -2.6,0a2,2 0 0 1 -2.6,-0.4',
  box: 'M2.5,4h3M7,4h3M11.5,4h2v2M13.5,8v4h-2M10,12h-3M5.5,12h-3v-2M2.5,8v-4',
  arrow: 'M2.5,12.5L13,3.5M13,3.5l-4.6,1M13,3.5l-1.6,4.4',
};

interface MarkToolsProps {
  armed: MarkKind | null;
  onArm(kind: MarkKind | null): void;
}

/** The reviewer's pen: note, cloud, box, arrow. */
export function MarkTools({ armed, onArm }: MarkToolsProps) {
  return (
    <fieldset className="mark-tools" aria-label="Marks on the drawing">
      {markKinds.map((kind) => (
        <button
          key={kind}
          type="button"
          aria-label={markWords[kind].tool}
          aria-pressed={armed === kind}
          onClick={() => onArm(armed === kind ? null : kind)}
        >
          <svg width={16} height={16} viewBox="0 0 16 16" aria-hidden="true">
            <path d={ICONS[kind]} fill="none" stroke="currentColor" strokeWidth={1.4} strokeLinecap="round" />
          </svg>
        </button>
      ))}
    </fieldset>
  );
}
