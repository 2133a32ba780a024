import { Fragment } from 'react';
import type { Option, SheetEdit } from './sentence.ts';

interface Props {
  readonly options: readonly Option[];
  readonly onChoose: (edit: SheetEdit) => void;
}

/** A few words to choose from; arrow keys move, Enter or a click chooses. */
export function ChoiceList({ options, onChoose }: Props) {
  const onKeyDown = (event: React.KeyboardEvent<HTMLDivElement>) => {
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const buttons = [...event.currentTarget.querySelectorAll('button')];
    const at = buttons.indexOf(document.activeElement as HTMLButtonElement);
    buttons[(at + step + buttons.length) % buttons.length]?.focus();
  };
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: arrow keys are a shortcut; Tab reaches every button too
    <div className="choices" onKeyDown={onKeyDown}>
      {options.map((option) => (
        <Fragment key={`${option.heading ?? ''} ${option.label} ${option.detail ?? ''}`}>
          {option.heading !== undefined && <p className="choices-heading">{option.heading}</p>}
          <button
            type="button"
            aria-pressed={option.isChosen}
            data-first={option.isChosen ? true : undefined}
            onClick={() => onChoose(option.edit)}
          >
            <span>{option.label}</span>
            {option.detail !== undefined && <small>{option.detail}</small>}
          </button>
        </Fragment>
      ))}
    </div>
  );
}
