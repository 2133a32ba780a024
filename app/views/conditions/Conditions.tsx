import { useCallback, useRef, useState } from 'react';
import type { Run, Sheet, SheetFile } from '../../../core/index.ts';
import { buildSentence } from './buildSentence.ts';
import { ConditionsFoot } from './ConditionsFoot.tsx';
import { editSheet, whatIsWrong } from './editSheet.ts';
import { FieldPopover } from './FieldPopover.tsx';
import { SentenceText } from './SentenceText.tsx';
import type { SentenceField, SentencePart, SheetEdit } from './sentence.ts';

interface Props {
  readonly run: Run;
  readonly file: SheetFile;
  readonly sheet: Sheet;
  readonly onOpenFiles: () => void;
}

/** The conditions of the run as a sentence whose quantities can be changed in place. */
export function Conditions({ run, file, sheet, onOpenFiles }: Props) {
  const [open, setOpen] = useState<{ readonly id: string; readonly anchor: HTMLElement } | null>(null);
  const [showsMore, setShowsMore] = useState(false);
  const text = useRef<HTMLDivElement>(null);
  const { main, more } = buildSentence(file, sheet);
  const fields = [...main, ...more].filter(isField);
  const opened = fields.find(({ id }) => id === open?.id);
  const close = useCallback(() => setOpen(null), []);
  const edit = useCallback(
    (change: SheetEdit) => {
      if (opened !== undefined) editSheet(`changed the ${opened.label}`, change);
    },
    [opened],
  );
  const openField = (id: string, anchor: HTMLElement) => setOpen({ id, anchor });
  const assumedInMore = more.filter(isField).filter(({ assumed }) => assumed).length;

  return (
    <section className="conditions" aria-label="Conditions">
      <div className="sentence" ref={text}>
        <SentenceText parts={main} openField={open?.id ?? null} onOpen={openField} />{' '}
        <button
          type="button"
          className={`more${assumedInMore > 0 && !showsMore ? ' assumed' : ''}`}
          aria-expanded={showsMore}
          onClick={() => setShowsMore(!showsMore)}
        >
          {showsMore ? 'Fewer conditions' : `More conditions${assumedInMore > 0 ? ` (${assumedInMore} assumed)` : ''}`}
        </button>
        {/* Always there, because a printed page shows it all. */}
        <span className="sentence-more" hidden={!showsMore}>
          {' '}
          <SentenceText parts={more} openField={open?.id ?? null} onOpen={openField} />
        </span>
        {open !== null && opened !== undefined && (
          <FieldPopover
            key={open.id}
            field={opened}
            anchor={open.anchor}
            check={(change) => whatIsWrong(change(file), run, sheet)}
            onEdit={edit}
            onClose={close}
          />
        )}
      </div>
      <ConditionsFoot run={run} file={file} fields={fields} onOpenFiles={onOpenFiles} />
    </section>
  );
}

function isField(part: SentencePart): part is SentenceField {
  return typeof part !== 'string';
}
