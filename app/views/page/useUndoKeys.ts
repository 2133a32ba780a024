import { useEffect } from 'react';
import { redo, undo } from '../../state/inputStore.ts';

/** Ctrl+Z undoes, Ctrl+Shift+Z and Ctrl+Y redo; in a text field they are the field's own. */
export function useUndoKeys(): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || isTextField(event.target)) return;
      const key = event.key.toLowerCase();
      if (key === 'z' && !event.shiftKey) undo();
      else if (key === 'y' || (key === 'z' && event.shiftKey)) redo();
      else return;
      event.preventDefault();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, []);
}

function isTextField(target: EventTarget | null): boolean {
  return target instanceof HTMLInputElement && target.type === 'text';
}
