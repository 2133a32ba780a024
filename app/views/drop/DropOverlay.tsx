import { useEffect, useState } from 'react';

/** Takes files dropped anywhere on the page, and says so while they hover. */
export function DropOverlay({ onFiles }: { readonly onFiles: (files: readonly File[]) => void }) {
  const [hovers, setHovers] = useState(false);
  useEffect(() => {
    const hasFiles = (event: DragEvent) => event.dataTransfer?.types.includes('Files') === true;
    const over = (event: DragEvent) => {
      if (!hasFiles(event)) return;
      event.preventDefault();
      setHovers(true);
    };
    // Leaving one element for another within the page tells where to; leaving the page does not.
    const leave = (event: DragEvent) => {
      if (event.relatedTarget === null) setHovers(false);
    };
    const drop = (event: DragEvent) => {
      if (!hasFiles(event)) return;
      event.preventDefault();
      setHovers(false);
      onFiles([...(event.dataTransfer?.files ?? [])]);
    };
    window.addEventListener('dragenter', over);
    window.addEventListener('dragover', over);
    window.addEventListener('dragleave', leave);
    window.addEventListener('drop', drop);
    return () => {
      window.removeEventListener('dragenter', over);
      window.removeEventListener('dragover', over);
      window.removeEventListener('dragleave', leave);
      window.removeEventListener('drop', drop);
    };
  }, [onFiles]);
  if (!hovers) return null;
  return (
    <div className="drop-overlay">
      <p>
        Let go to read and fit.
        <small>Exports with volumes and pH or mV; sheets of conditions as .json</small>
      </p>
    </div>
  );
}
