import { Component, type ReactNode } from 'react';

interface ErrorBoundaryProps {
  children: ReactNode;
}

/** Shows the error page in place of whatever threw below it. */
export class ErrorBoundary extends Component<ErrorBoundaryProps, { error: Error | null }> {
  override state = { error: null as Error | null };

  static getDerivedStateFromError(error: unknown) {
    return { error: error instanceof Error ? error : new Error(String(error)) };
  }

  override render() {
    return this.state.error ? <ErrorPage error={this.state.error} /> : this.props.children;
  }
}

interface ErrorPageProps {
  error: Error;
}

/** Says that the app made a mistake, that nothing held is lost, and what to do next. */
export function ErrorPage({ error }: ErrorPageProps) {
  return (
    <main className="mx-auto grid max-w-[640px] gap-5 p-6 text-[18px]">
      <h1 className="text-[32px] leading-tight font-bold">This screen broke</h1>
      <p>
        The mistake is ours. What you logged is kept on this device. Open the app again; if it breaks again,
        show these words to the foreman.
      </p>
      <p className="border-l-[3px] border-redlead pl-4 break-words text-slate">{error.message}</p>
      <button
        type="button"
        className="min-h-key rounded-key bg-verdigris px-5 font-bold text-on-verdigris"
        onClick={() => window.location.assign('/')}
      >
        Open the app again
      </button>
    </main>
  );
}
