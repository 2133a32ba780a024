/** Up to so many are named at once; more are counted, and named when asked for. */
const mostNamed = 2;

/** The assumed quantities on which a result rests. */
export function RestsOn({ names }: { readonly names: readonly string[] }) {
  if (names.length <= mostNamed)
    return (
      <>
        rests on <span className="assumed-mark">assumed</span> {names.join(' and ')}
      </>
    );
  return (
    <details>
      <summary>
        rests on <span className="assumed-mark">{names.length} assumed values</span>
      </summary>
      {names.join(', ')}
    </details>
  );
}
