import type { SpeciationResult } from '../../../core/index.ts';
import type { Rectangle } from '../../figures/rectangle.ts';

interface Props {
  readonly speciation: SpeciationResult;
  readonly panel: Rectangle;
  /** Free room between the buttons and the panel, px. */
  readonly room: number;
  readonly front: ReadonlySet<string>;
  readonly onChange: (front: ReadonlySet<string>) => void;
}

/** Which proton systems stand in front in the speciation; the others stay, lighter and without names. */
export function SystemChooser({ speciation, panel, room, front, onChange }: Props) {
  const toggle = (prefix: string) => {
    const next = new Set(front);
    if (!next.delete(prefix)) next.add(prefix);
    if (next.size > 0) onChange(next);
  };
  return (
    <fieldset
      className="figure-systems"
      style={{ left: panel.left, width: panel.width, bottom: `calc(100% - ${panel.top - room}px)` }}
    >
      <legend className="figure-hidden">Substances in front</legend>
      {speciation.systems.map(({ name, prefix }) => (
        <button key={prefix} type="button" aria-pressed={front.has(prefix)} onClick={() => toggle(prefix)}>
          {name}
        </button>
      ))}
    </fieldset>
  );
}
