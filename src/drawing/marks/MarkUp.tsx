import type { DrawingMark } from '../../study/index.ts';
import { screenPalette } from '../glyphs/Palette.ts';
import { MarkGlyph } from './MarkGlyph.tsx';
import type { MarkShape } from './markShape.ts';

/** What of a mark is in the hand: all of it, or one end or corner. */
export type Grip = 'all' | 'from' | 'to';

interface MarkUpProps {
  mark: DrawingMark;
  shape: MarkShape;
  name: string;
  withGrips: boolean;
  onFocus(): void;
  onBlur(): void;
  onPress(grip: Grip, event: React.PointerEvent<SVGElement>): void;
  onFollow(event: React.PointerEvent): void;
  onRelease(): void;
  onCancel(): void;
  onKeyDown(event: React.KeyboardEvent): void;
}

const FRAME = 4;

/** One mark with its hit areas, its frame and, with the keyboard, the grips of its ends. */
export function MarkUp(props: MarkUpProps) {
  const { mark, shape, withGrips, onPress } = props;
  const { box, wordsBox, path } = shape;
  const pointer = {
    onPointerMove: props.onFollow,
    onPointerUp: props.onRelease,
    onPointerCancel: props.onCancel,
  };
  const button = {
    role: 'button',
    tabIndex: 0,
    'aria-label': props.name,
    onFocus: props.onFocus,
    onBlur: props.onBlur,
    onKeyDown: props.onKeyDown,
    onPointerDown: (event: React.PointerEvent<SVGGElement>) => onPress('all', event),
  };
  return (
    <g className="mark-up" data-mark={mark.id} {...button} {...pointer}>
      {path !== '' && <path className="hit-line" d={path} />}
      <rect
        className="hit"
        x={wordsBox.x - 8}
        y={wordsBox.y - 2}
        width={wordsBox.width + 12}
        height={wordsBox.height + 4}
      />
      <rect
        className="frame"
        x={box.x - FRAME}
        y={box.y - FRAME}
        width={box.width + 2 * FRAME}
        height={box.height + 2 * FRAME}
        rx={3}
      />
      <MarkGlyph shape={shape} palette={screenPalette} />
      {withGrips &&
        (['from', 'to'] as const).map((grip) => (
          <circle
            key={grip}
            className="handle"
            cx={shape[grip].x}
            cy={shape[grip].y}
            r={6}
            onPointerDown={(event) => onPress(grip, event)}
          />
        ))}
    </g>
  );
}
