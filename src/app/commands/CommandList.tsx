import { useState } from 'react';
import {
  Autocomplete,
  Dialog,
  Input,
  Keyboard,
  Label,
  Menu,
  MenuItem,
  Modal,
  ModalOverlay,
  SearchField,
  Text,
  useFilter,
} from 'react-aria-components';
import { shownKeys } from '../../keys/index.ts';
import type { Command } from './command.ts';

interface Props {
  commands: readonly Command[];
  open: boolean;
  onOpenChange(open: boolean): void;
}

/** Every command by its trade words, found by typing. */
export function CommandList({ commands, open, onOpenChange }: Props) {
  const { contains } = useFilter({ sensitivity: 'base' });
  const [text, setText] = useState('');
  const close = (next: boolean) => {
    if (!next) setText('');
    onOpenChange(next);
  };
  // A search field would only clear itself at the first Escape.
  const closeOnEscape = (event: { key: string }) => event.key === 'Escape' && close(false);
  return (
    <ModalOverlay isOpen={open} onOpenChange={close} isDismissable className="veil">
      <Modal className="command-list">
        <Dialog aria-label="Commands">
          <Autocomplete filter={contains} inputValue={text} onInputChange={setText}>
            <SearchField autoFocus aria-label="Find a command" onKeyDown={closeOnEscape}>
              <Label className="visually-hidden">Find a command</Label>
              <Input placeholder="What would you like to do?" />
            </SearchField>
            <Menu
              aria-label="Commands"
              items={commands}
              renderEmptyState={() => <p className="hint">No command with these words.</p>}
              onAction={(id) => {
                close(false);
                commands.find((command) => command.id === id)?.run();
              }}
              disabledKeys={commands
                .filter((command) => command.enabled === false)
                .map((command) => command.id)}
            >
              {(command: Command) => (
                <MenuItem id={command.id} textValue={command.words}>
                  <Text slot="label">{command.words}</Text>
                  {command.keys && <Keyboard>{shownKeys(command.keys)}</Keyboard>}
                </MenuItem>
              )}
            </Menu>
          </Autocomplete>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}
