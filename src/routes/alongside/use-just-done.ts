import { useEffect, useState } from 'react';
import { useLocation, useNavigate } from 'react-router-dom';
import { isDone, type Done } from '#src/routes/alongside/done.ts';

/** What was just done, by the screen before this one or on it, until it is gone; not there again after a reload. */
export function useJustDone(): { done: Done | null; setDone: (done: Done | null) => void } {
  const location = useLocation();
  const navigate = useNavigate();
  const [done, setDone] = useState<Done | null>(isDone(location.state) ? location.state : null);
  useEffect(() => {
    if (location.state !== null) void navigate(location, { replace: true, state: null });
  }, [location, navigate]);
  return { done, setDone };
}
