import { redo, undo } from '../../state/inputStore.ts';
import { samples } from '../../state/samples.ts';
import { useInputs } from '../../state/useInputs.ts';
import { Disclosure } from '../../widgets/Disclosure.tsx';

interface Props {
  readonly onOpenFiles: () => void;
  readonly onOpenSample: (index: number) => void;
}

/** The name of the tool and what concerns the page as a whole. */
export function Masthead({ onOpenFiles, onOpenSample }: Props) {
  const lastDone = useInputs(({ past }) => past.at(-1)?.words ?? null);
  const nextDone = useInputs(({ future }) => future[0]?.words ?? null);
  return (
    <header className="masthead">
      <h1>Stepwell</h1>
      <p className="masthead-hint">Drop a titration export anywhere on this page.</p>
      <nav className="masthead-actions" aria-label="Files and history">
        <button type="button" className="quiet" onClick={onOpenFiles}>
          Open files
        </button>
        <Disclosure label="Samples">
          {(close) => (
            <ul>
              {samples.map(({ title, fileName }, index) => (
                <li key={fileName}>
                  <button
                    type="button"
                    onClick={() => {
                      close();
                      onOpenSample(index);
                    }}
                  >
                    {title}
                  </button>
                </li>
              ))}
            </ul>
          )}
        </Disclosure>
        <button
          type="button"
          className="quiet"
          disabled={lastDone === null}
          title={lastDone === null ? undefined : `Undo: ${lastDone}`}
          aria-keyshortcuts="Control+Z"
          onClick={undo}
        >
          Undo
        </button>
        <button
          type="button"
          className="quiet"
          disabled={nextDone === null}
          title={nextDone === null ? undefined : `Redo: ${nextDone}`}
          aria-keyshortcuts="Control+Shift+Z Control+Y"
          onClick={redo}
        >
          Redo
        </button>
      </nav>
    </header>
  );
}
