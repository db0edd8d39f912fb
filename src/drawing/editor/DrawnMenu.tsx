import { Button, Header, Menu, MenuItem, MenuSection, MenuTrigger, Popover } from 'react-aria-components';
import {
  drawnItems,
  drawnOf,
  drawnWords,
  type Edit,
  type Study,
  setDrawn,
  setSymbols,
  symbolSetOf,
  symbolSets,
  symbolSetWords,
} from '../../study/index.ts';

export interface DrawnMenuProps {
  study: Study;
  onEdit(edit: Edit): void;
}

const sentence = (words: string) => `${words.charAt(0).toUpperCase()}${words.slice(1)}`;

/** What the drawing shows beside its symbols, and the standard these follow; kept with the study. */
export function DrawnMenu({ study, onEdit }: DrawnMenuProps) {
  const shown = drawnOf(study);
  return (
    <MenuTrigger>
      <Button className="drawn-menu">
        shown <span aria-hidden="true">▾</span>
      </Button>
      <Popover className="popover" placement="bottom end">
        <Menu aria-label="Shown on the drawing" className="drawn-list">
          <MenuSection
            selectionMode="multiple"
            selectedKeys={shown}
            onSelectionChange={(keys) => {
              const chosen = keys === 'all' ? new Set(drawnItems) : keys;
              const item = drawnItems.find((one) => chosen.has(one) !== shown.has(one));
              if (item) onEdit(setDrawn(study, item, chosen.has(item)));
            }}
          >
            <Header>Shown on the drawing</Header>
            {drawnItems.map((item) => (
              <MenuItem key={item} id={item} shouldCloseOnSelect={false}>
                {sentence(drawnWords[item])}
              </MenuItem>
            ))}
          </MenuSection>
          <MenuSection
            selectionMode="single"
            disallowEmptySelection
            selectedKeys={[symbolSetOf(study)]}
            onSelectionChange={(keys) => {
              const symbols = symbolSets.find((one) => keys !== 'all' && keys.has(one));
              if (symbols) onEdit(setSymbols(study, symbols));
            }}
          >
            <Header>Symbols after</Header>
            {symbolSets.map((symbols) => (
              <MenuItem key={symbols} id={symbols} shouldCloseOnSelect={false}>
                {symbolSetWords[symbols]}
              </MenuItem>
            ))}
          </MenuSection>
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}
