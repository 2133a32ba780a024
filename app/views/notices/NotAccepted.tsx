import { useWork } from '../../state/useWork.ts';
import { workStore } from '../../state/workStore.ts';
import { RefusalList } from '../../widgets/RefusalList.tsx';

/** What was handed over and could not be used. All else stays as it was. */
export function NotAccepted() {
  const notAccepted = useWork((state) => state.notAccepted);
  // The element stays, so that screen readers hear what appears in it.
  return (
    <div aria-live="polite">
      {notAccepted !== null && (
        <section className="notice" aria-label="Not accepted">
          <h2>Not accepted: {notAccepted.what}</h2>
          <RefusalList refusals={notAccepted.refusals} />
          <button type="button" className="link" onClick={() => workStore.setState({ notAccepted: null })}>
            Put this note away
          </button>
        </section>
      )}
    </div>
  );
}
