import type { Run, SheetFile } from '../../../core/index.ts';
import { changeInputs } from '../../state/inputStore.ts';
import { useInputs } from '../../state/useInputs.ts';
import { saveText } from '../../widgets/saveText.ts';
import { editSheet } from './editSheet.ts';
import type { SentenceField } from './sentence.ts';

interface Props {
  readonly run: Run;
  readonly file: SheetFile;
  readonly fields: readonly SentenceField[];
  readonly onOpenFiles: () => void;
}

/** What can be done with the conditions as a whole. */
export function ConditionsFoot({ run, file, fields, onOpenFiles }: Props) {
  const runs = useInputs(({ present }) => present.runs);
  const assumed = fields.filter(({ confirm }) => confirm !== null);
  const confirmAll = () =>
    editSheet('confirmed all assumed values', (before) =>
      assumed.reduce((sheet, { confirm }) => (confirm === null ? sheet : confirm(sheet)), before),
    );
  const others = runs.filter((other) => other.sheet !== file).length;
  const giveToAll = () =>
    changeInputs('gave these conditions to every run', (inputs) => ({
      ...inputs,
      runs: inputs.runs.map((other) => ({ ...other, sheet: file })),
    }));
  return (
    <p className="conditions-foot">
      {assumed.length > 0 ? (
        <span className="assumed-count">
          <span className="assumed-mark">{assumed.length} assumed</span>
          <button type="button" className="link" onClick={confirmAll}>
            Confirm all
          </button>
        </span>
      ) : (
        <span>Nothing is assumed.</span>
      )}
      {others > 0 && runs.length > 1 && (
        <button type="button" className="link" onClick={giveToAll}>
          Use for all {runs.length} runs
        </button>
      )}
      <button
        type="button"
        className="link"
        onClick={() => saveText(`${run.file.replace(/\.\w+$/, '')}.sheet.json`, `${JSON.stringify(file, null, 2)}\n`)}
      >
        Save conditions
      </button>
      <button type="button" className="link" onClick={onOpenFiles}>
        Open conditions
      </button>
    </p>
  );
}
