import { useEffect } from 'react';
import { matchesKeys } from '../../keys/index.ts';
import type { Command } from './command.ts';

function typing(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement && target.closest('input, textarea, select, [contenteditable]') !== null
  );
}

/** A dialog or menu lies above the workbench and has the keyboard. */
function underLayer(target: EventTarget | null): boolean {
  return target instanceof Element && target.closest('.veil, .popover') !== null;
}

/** Runs a command when its keys are pressed; a field being typed in keeps its own undo and letters. */
export function useCommandKeys(commands: readonly Command[], onCommandList: () => void): void {
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (event.defaultPrevented) return;
      if (matchesKeys('Mod+K', event)) {
        event.preventDefault();
        onCommandList();
        return;
      }
      const command = commands.find((one) => one.keys && matchesKeys(one.keys, event));
      if (!command || command.enabled === false) return;
      if (underLayer(event.target) && !command.id.startsWith('study.save')) return;
      const inField = typing(event.target);
      if (inField && (!command.keys?.includes('Mod') || command.id.startsWith('edit.'))) return;
      event.preventDefault();
      command.run();
    };
    window.addEventListener('keydown', press);
    return () => window.removeEventListener('keydown', press);
  }, [commands, onCommandList]);
}
