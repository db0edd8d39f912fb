import { useState } from 'react';
import { NoteMenu } from '../notes/NoteMenu.tsx';
import { PICTURE_WAYS, type PictureWay } from '../notes/noteActions.ts';

interface FigureMenuProps {
  /** What the picture shows, e.g. "the rail". */
  name: string;
  /** Ways that are not offered here. */
  without?: readonly PictureWay[];
  onPicture(way: PictureWay): void;
}

/** A small button that hands a figure on: as a picture to the clipboard or a file, or its numbers. */
export function FigureMenu({ name, without = [], onPicture }: FigureMenuProps) {
  const [anchor, setAnchor] = useState<HTMLElement | null>(null);
  const actions = PICTURE_WAYS.filter(({ way }) => !without.includes(way)).map(({ way, words }) => ({
    id: way,
    words,
    run: () => onPicture(way),
  }));
  return (
    <>
      <button
        type="button"
        className="figure-menu"
        aria-haspopup="menu"
        onClick={(event) => setAnchor(event.currentTarget)}
      >
        picture<span className="visually-hidden"> of {name}</span>…
      </button>
      {anchor && (
        <NoteMenu
          name={`Picture of ${name}`}
          actions={[actions]}
          anchor={anchor}
          onClose={() => setAnchor(null)}
        />
      )}
    </>
  );
}
