import { useEffect, useState } from 'react';

const MINUTE_MS = 60_000;

/** Counts minutes while a screen is open, so that ages on it are told anew. */
export function useMinute(): number {
  const [minute, setMinute] = useState(0);
  useEffect(() => {
    const timer = setInterval(() => setMinute((count) => count + 1), MINUTE_MS);
    return () => clearInterval(timer);
  }, []);
  return minute;
}
