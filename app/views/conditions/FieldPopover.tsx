import { useCallback, useRef } from 'react';
import { Popover } from '../../widgets/Popover.tsx';
import { ChoiceList } from './ChoiceList.tsx';
import { PlainForm } from './PlainForm.tsx';
import { QuantityForm } from './QuantityForm.tsx';
import type { SentenceField, SheetEdit } from './sentence.ts';

interface Props {
  readonly field: SentenceField;
  readonly anchor: HTMLElement;
  /** What is wrong with a change; null where it may be made. */
  readonly check: (edit: SheetEdit) => string | null;
  readonly onEdit: (edit: SheetEdit) => void;
  readonly onClose: () => void;
}

/**
 * The form of one field. Enter, "Set" and a click elsewhere take over a change that may be made; Escape leaves things
 * as they were.
 */
export function FieldPopover({ field, anchor, check, onEdit, onClose }: Props) {
  // The change typed so far: undefined where nothing was typed, null where it may not be made.
  const draft = useRef<SheetEdit | null | undefined>(undefined);
  const { editor, confirm } = field;

  const take = (edit: SheetEdit) => {
    onEdit(edit);
    onClose();
  };
  const leave = useCallback(() => {
    if (draft.current) onEdit(draft.current);
    onClose();
  }, [onEdit, onClose]);
  const submit = (event: React.FormEvent) => {
    event.preventDefault();
    if (draft.current) take(draft.current);
    // Nothing typed: what stands there is what is meant.
    else if (draft.current === undefined) confirm === null ? onClose() : take(confirm);
  };

  return (
    <Popover label={field.label} anchor={anchor} onLeave={leave} onCancel={onClose}>
      <form onSubmit={submit} noValidate>
        <p className="popover-title">{field.label}</p>
        {field.hint !== undefined && <p className="popover-hint">{field.hint}</p>}
        {editor.kind === 'choice' && <ChoiceList options={editor.options} onChoose={take} />}
        {editor.kind === 'quantity' && (
          <QuantityForm
            editor={editor}
            check={(quantity) => check((file) => editor.set(file, quantity))}
            onDraft={(quantity) => {
              draft.current = quantity === null ? null : (file) => editor.set(file, quantity);
            }}
          />
        )}
        {(editor.kind === 'number' || editor.kind === 'text') && (
          <PlainForm
            editor={editor}
            label={field.label}
            check={check}
            onDraft={(edit) => {
              draft.current = edit;
            }}
          />
        )}
        <div className="popover-foot">
          {confirm !== null && (
            <button type="button" className="confirm" onClick={() => take(confirm)}>
              Confirm as it is
            </button>
          )}
          <span className="spring" />
          <button type="button" className="plain" onClick={onClose}>
            Cancel
          </button>
          {editor.kind !== 'choice' && (
            <button type="submit" className="primary">
              Set
            </button>
          )}
        </div>
      </form>
    </Popover>
  );
}
