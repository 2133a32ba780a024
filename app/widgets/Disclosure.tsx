import { type ReactNode, useCallback, useRef, useState } from 'react';
import { useDismiss } from './useDismiss.ts';

interface Props {
  readonly label: string;
  /** What to show when open; `close` puts it away again. */
  readonly children: (close: () => void) => ReactNode;
}

/** A word that opens a short list under it. */
export function Disclosure({ label, children }: Props) {
  const [isOpen, setIsOpen] = useState(false);
  const box = useRef<HTMLDivElement>(null);
  const head = useRef<HTMLButtonElement>(null);
  const close = useCallback(() => setIsOpen(false), []);
  useDismiss(box, isOpen, close);
  const closeAndReturn = () => {
    close();
    head.current?.focus();
  };
  const onKeyDown = (event: React.KeyboardEvent) => {
    if (event.key === 'Escape' && isOpen) {
      event.stopPropagation();
      closeAndReturn();
    }
  };
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: Escape is a shortcut; the button closes it too
    <div className="disclosure" ref={box} onKeyDown={onKeyDown}>
      <button ref={head} type="button" className="quiet" aria-expanded={isOpen} onClick={() => setIsOpen(!isOpen)}>
        {label}
      </button>
      {isOpen && <div className="disclosure-list">{children(closeAndReturn)}</div>}
    </div>
  );
}
