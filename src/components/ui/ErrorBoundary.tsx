import { Component, type ReactNode } from 'react';

interface Props {
  children: ReactNode;
  /** Called once with what was thrown, before the sentence is shown: the place to put unsaved work aside. */
  onError?: (error: unknown) => void;
  /** What to show instead; the default says what happened and offers to load the page again. */
  fallback?: (retry: () => void) => ReactNode;
}

/** Keeps a fault in one island from taking the page: shows a sentence and a way on. */
export class ErrorBoundary extends Component<Props, { failed: boolean }> {
  override state = { failed: false };

  static getDerivedStateFromError() {
    return { failed: true };
  }

  override componentDidCatch(error: unknown) {
    this.props.onError?.(error);
  }

  private readonly retry = () => this.setState({ failed: false });

  override render() {
    if (!this.state.failed) return this.props.children;
    if (this.props.fallback) return this.props.fallback(this.retry);
    return (
      <div role="alert" className="notice notice-attention">
        <p>
          <b>This part of the page has stopped.</b> The rest still works. Try it again; if it stops again, load the page anew.
        </p>
        <button type="button" className="btn btn-small mt-2" onClick={this.retry}>
          Try again
        </button>
      </div>
    );
  }
}
