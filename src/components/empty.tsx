import { type ReactNode, useEffect, useState } from 'react';

interface EmptyProps {
  /** What is not there, and what would bring it here. */
  children: ReactNode;
  action?: ReactNode;
}

/** A list with nothing in it, said in words. */
export function Empty({ children, action }: EmptyProps) {
  return (
    <div className="grid justify-items-start gap-4 px-4 py-6 text-slate md:px-6">
      <div>{children}</div>
      {action}
    </div>
  );
}

interface LoadingProps {
  words?: string;
}

const QUIET_MS = 400;

/** Nothing for the time that a local read takes; after that a quiet line of words. */
export function Loading({ words = 'Reading what is on this device …' }: LoadingProps) {
  const [isSlow, setSlow] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setSlow(true), QUIET_MS);
    return () => clearTimeout(timer);
  }, []);
  return (
    <p role="status" className="px-4 py-6 text-slate md:px-6">
      {isSlow && words}
    </p>
  );
}
