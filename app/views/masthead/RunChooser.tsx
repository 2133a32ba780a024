import { decidedRun } from '../../state/decidedRun.ts';
import { showRun } from '../../state/inputStore.ts';
import { samples } from '../../state/samples.ts';
import { useInputs } from '../../state/useInputs.ts';

/** Which run is shown, and the others at hand. */
export function RunChooser() {
  const { runs, shown } = useInputs(({ present }) => present);
  const current = runs[shown];
  if (current === undefined) return null;
  const title = samples.find(({ fileName }) => fileName === decidedRun(current).file)?.title;
  if (runs.length === 1)
    return (
      <p className="run-name">
        {decidedRun(current).name}
        {current.isSample && <span className="run-origin"> · {title} · invented data</span>}
      </p>
    );
  return (
    <nav className="run-chooser" aria-label="Runs">
      {runs.map((run, index) => (
        <button
          key={`${run.file} ${run.index}`}
          type="button"
          className="run-choice"
          aria-current={index === shown ? 'true' : undefined}
          onClick={() => showRun(index)}
        >
          {decidedRun(run).name}
        </button>
      ))}
    </nav>
  );
}
