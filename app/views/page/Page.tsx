import { useCallback, useEffect, useRef } from 'react';
import type { Desk } from '../../state/createDesk.ts';
import { toggleRow } from '../../state/toggleRow.ts';
import { useShownRun } from '../../state/useShownRun.ts';
import { Conditions } from '../conditions/Conditions.tsx';
import { declaredFields } from '../conditions/declaredFields.ts';
import { DropOverlay } from '../drop/DropOverlay.tsx';
import { CrossedFigure } from '../figure/CrossedFigure.tsx';
import { Masthead } from '../masthead/Masthead.tsx';
import { RunChooser } from '../masthead/RunChooser.tsx';
import { NotAccepted } from '../notices/NotAccepted.tsx';
import { WorkLine } from '../notices/WorkLine.tsx';
import { MoreResults } from '../results/MoreResults.tsx';
import { Results } from '../results/Results.tsx';
import { RowsTable } from '../rows/RowsTable.tsx';
import { PointingContext } from './pointing.ts';
import { usePointed } from './usePointed.ts';
import { useUndoKeys } from './useUndoKeys.ts';

/** The one page: conditions, figure, results. */
export function Page({ desk }: { readonly desk: Desk }) {
  const shown = useShownRun();
  const pointing = usePointed(shown === null ? '' : `${shown.input.file} ${shown.input.index}`);
  const picker = useRef<HTMLInputElement>(null);
  useUndoKeys();
  const title = shown === null ? 'Stepwell' : `${shown.run.name} – Stepwell`;
  useEffect(() => {
    document.title = title;
  }, [title]);
  const latest = shown?.latest ?? null;
  const declared = latest === null ? null : declaredFields(latest.input.sheet, latest.result.sheet);
  const openFiles = useCallback((files: readonly File[]) => void desk.open(files), [desk]);
  const choose = useCallback(() => picker.current?.click(), []);

  return (
    <>
      <Masthead onOpenFiles={choose} onOpenSample={(index) => void desk.openSample(index)} />
      <input
        ref={picker}
        type="file"
        multiple
        hidden
        aria-label="Files to open"
        onChange={(event) => {
          openFiles([...(event.target.files ?? [])]);
          // So that the same file can be chosen again.
          event.target.value = '';
        }}
      />
      <main>
        <NotAccepted />
        <RunChooser />
        {shown !== null && shown.sheet !== null && (
          <Conditions
            key={`${shown.input.file} ${shown.input.index}`}
            run={shown.run}
            file={shown.input.sheet}
            sheet={shown.sheet}
            onOpenFiles={choose}
          />
        )}
        <WorkLine onStop={desk.stop} onRetry={desk.retry} />
        {shown !== null && (
          <PointingContext value={pointing}>
            <div className="findings" aria-busy={!shown.isCurrent}>
              <div className="figure-side">
                {latest === null ? (
                  <p className="figure-empty">The curve and its results appear here as soon as the run is fitted.</p>
                ) : (
                  <CrossedFigure result={latest.result} onToggleRow={toggleRow} pointed={pointing.pointed} />
                )}
                <RowsTable
                  run={shown.run}
                  points={shown.isCurrent ? (latest?.result.points ?? []) : []}
                  selectedLine={pointing.pointed?.line ?? null}
                  onSelect={(line) => pointing.point(line === null ? null : { line })}
                  onToggle={toggleRow}
                />
              </div>
              {latest !== null && declared !== null && (
                <>
                  <Results result={latest.result} declared={declared} />
                  <MoreResults result={latest.result} declared={declared} />
                </>
              )}
            </div>
          </PointingContext>
        )}
      </main>
      <footer className="page-foot">
        <p>
          Results support the laboratory’s own procedures and qualified judgement; they do not replace them. Nothing
          leaves this page. The sample runs are invented.
        </p>
      </footer>
      <DropOverlay onFiles={openFiles} />
    </>
  );
}
