import type { SentenceField, SentencePart } from './sentence.ts';

interface Props {
  readonly parts: readonly SentencePart[];
  readonly openField: string | null;
  readonly onOpen: (id: string, anchor: HTMLElement) => void;
}

/** Words and fields in a line of text. */
export function SentenceText({ parts, openField, onOpen }: Props) {
  return parts.map((part, index) =>
    typeof part === 'string' ? (
      // biome-ignore lint/suspicious/noArrayIndexKey: words have no identity but their place
      <span key={index}>{part}</span>
    ) : (
      <FieldButton key={part.id} field={part} isOpen={part.id === openField} onOpen={onOpen} />
    ),
  );
}

function FieldButton({
  field,
  isOpen,
  onOpen,
}: {
  readonly field: SentenceField;
  readonly isOpen: boolean;
  readonly onOpen: Props['onOpen'];
}) {
  const { id, label, text, assumed, isName } = field;
  return (
    // biome-ignore lint/a11y/useSemanticElements: a <button> cannot break across lines, and this is running text
    <span
      role="button"
      tabIndex={0}
      className={`field${assumed ? ' assumed' : ''}${isName === true ? ' name' : ''}`}
      data-field={id}
      aria-label={`${label}: ${text}${assumed ? ', assumed' : ''}`}
      aria-haspopup="dialog"
      aria-expanded={isOpen}
      onClick={(event) => onOpen(id, event.currentTarget)}
      onKeyDown={(event) => {
        if (event.key !== 'Enter' && event.key !== ' ') return;
        event.preventDefault();
        onOpen(id, event.currentTarget);
      }}
    >
      {text}
    </span>
  );
}
