import { QueryErrorResetBoundary } from '@tanstack/react-query';
import { Component, Suspense, type ReactNode } from 'react';
import { wordsOf } from '../lib/problem.ts';
import { Button } from './button.tsx';

interface PanelProps {
  readonly fallback: ReactNode;
  readonly children: ReactNode;
  /** Decides what a failure shows; without it, what happened and a way to try again. */
  readonly renderError?: (error: unknown, retry: () => void) => ReactNode;
}

/** A part of a page that loads and fails by itself: its skeleton while it loads, and on failure only this part is replaced. */
export function Panel({ fallback, children, renderError }: PanelProps) {
  return (
    <QueryErrorResetBoundary>
      {({ reset }) => (
        <Boundary onReset={reset} renderError={renderError ?? failure}>
          <Suspense fallback={fallback}>{children}</Suspense>
        </Boundary>
      )}
    </QueryErrorResetBoundary>
  );
}

function failure(error: unknown, retry: () => void): ReactNode {
  return <Failure error={error} retry={retry} />;
}

export function Failure({ error, retry }: { readonly error: unknown; readonly retry?: () => void }) {
  return (
    <div role="alert" className="border border-madder bg-sheet px-5 py-4">
      <p className="font-semibold text-madder">
        <span aria-hidden="true">▲</span> This part could not be shown
      </p>
      <p className="mt-1">{wordsOf(error)}</p>
      {retry !== undefined && (
        <Button className="mt-3" onClick={retry}>
          Try again
        </Button>
      )}
    </div>
  );
}

interface BoundaryProps {
  readonly onReset: () => void;
  readonly renderError: (error: unknown, retry: () => void) => ReactNode;
  readonly children: ReactNode;
}

type BoundaryState = { readonly failed: false } | { readonly failed: true; readonly error: unknown };

class Boundary extends Component<BoundaryProps, BoundaryState> {
  override state: BoundaryState = { failed: false };

  static getDerivedStateFromError(error: unknown): BoundaryState {
    return { failed: true, error };
  }

  private readonly retry = () => {
    this.props.onReset();
    this.setState({ failed: false });
  };

  override render(): ReactNode {
    if (!this.state.failed) return this.props.children;
    return this.props.renderError(this.state.error, this.retry);
  }
}
