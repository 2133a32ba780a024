import { Component, type ReactNode } from 'react';
import { undo } from '../../state/inputStore.ts';

interface State {
  readonly error: Error | null;
}

/** Keeps a mistake in drawing the page from taking the inputs with it: they live outside, and the page can be drawn anew. */
export class ErrorBoundary extends Component<{ readonly children: ReactNode }, State> {
  override state: State = { error: null };

  static getDerivedStateFromError(error: Error): State {
    return { error };
  }

  override render(): ReactNode {
    const { error } = this.state;
    if (error === null) return this.props.children;
    return (
      <main>
        <div className="notice" role="alert">
          <h2>The page could not be drawn</h2>
          <p>
            This is a mistake of the program. Your files and conditions are still here. What it says: {error.message}
          </p>
          <button type="button" className="link" onClick={() => this.setState({ error: null })}>
            Draw the page again
          </button>{' '}
          <button
            type="button"
            className="link"
            onClick={() => {
              undo();
              this.setState({ error: null });
            }}
          >
            Undo the last change and draw the page again
          </button>
        </div>
      </main>
    );
  }
}
