import type { ReactNode } from 'react';
import { SymbolGlyph } from '../glyphs/SymbolGlyph.tsx';
import { symbolPaths } from '../symbols/symbolShape.ts';

const STEPS = [
  { kind: 'supply', title: 'Drop a supply', words: 'it brings the intake busbar and its fault level' },
  { kind: 'transformer', title: 'Hang a transformer', words: 'its lower busbar comes with it' },
  { kind: 'load', title: 'Hang loads', words: 'motors, drives, loads, and the bank beside them' },
] as const;

/** What an empty paper says: three steps, and room for the other beginnings the app offers. */
export function EmptyHint({ children }: { children?: ReactNode }) {
  return (
    <div className="empty-hint">
      <ol>
        {STEPS.map(({ kind, title, words }, at) => (
          <li key={kind}>
            <svg width={40} height={44} viewBox="-28 -30 56 60" aria-hidden="true">
              <SymbolGlyph shape={symbolPaths(kind)} ink="currentColor" />
            </svg>
            <div>
              <strong>
                {at + 1}. {title}
              </strong>
              <span>{words}</span>
            </div>
          </li>
        ))}
      </ol>
      {children}
    </div>
  );
}
