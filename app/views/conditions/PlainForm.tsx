import { useId, useState } from 'react';
import { parseEntry } from '../../widgets/parseEntry.ts';
import type { Editor, SheetEdit } from './sentence.ts';

interface Props {
  readonly editor: Extract<Editor, { kind: 'number' | 'text' }>;
  readonly label: string;
  readonly check: (edit: SheetEdit) => string | null;
  /** Told at every change: the edit where it may be made, else null. */
  readonly onDraft: (edit: SheetEdit | null) => void;
}

/** One entry: a name, or a number without uncertainty. */
export function PlainForm({ editor, label, check, onDraft }: Props) {
  const id = useId();
  const [text, setText] = useState(editor.value === null ? '' : String(editor.value));
  const problem = read(text, editor, check).problem;
  const change = (next: string) => {
    setText(next);
    const { edit, problem: wrong } = read(next, editor, check);
    onDraft(wrong === null ? edit : null);
  };
  return (
    <>
      <label className="entry">
        <span className="unseen">{label}</span>
        <input
          type="text"
          inputMode={editor.kind === 'number' ? 'decimal' : 'text'}
          autoComplete="off"
          value={text}
          placeholder={editor.kind === 'number' ? (editor.openWords ?? undefined) : undefined}
          data-first
          aria-invalid={problem !== null}
          aria-describedby={problem === null ? undefined : `${id}-problem`}
          onChange={(event) => change(event.target.value)}
        />
        {editor.kind === 'number' && editor.unit !== '' && <span className="unit">{editor.unit}</span>}
      </label>
      <p className="problem" id={`${id}-problem`} aria-live="polite">
        {problem}
      </p>
    </>
  );
}

function read(
  text: string,
  editor: Props['editor'],
  check: Props['check'],
): { readonly edit: SheetEdit; readonly problem: string | null } {
  if (editor.kind === 'text') {
    const edit: SheetEdit = (file) => editor.set(file, text);
    return { edit, problem: check(edit) };
  }
  const isOpen = text.trim() === '' && editor.openWords !== null;
  const value = isOpen ? undefined : parseEntry(text);
  const edit: SheetEdit = (file) => editor.set(file, value ?? undefined);
  return { edit, problem: value === null ? 'Here belongs a number such as 25.0 or 25,0.' : check(edit) };
}
