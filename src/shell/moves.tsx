import { useEffect, useLayoutEffect, useRef } from 'react';
import { Outlet, useLocation, useNavigationType } from 'react-router-dom';

/** Around every screen: a new one begins at its top with the focus on its heading, one gone back to stands where it stood. */
export function Moves() {
  const { key, pathname } = useLocation();
  useScrollPlaces(key);
  const isFirst = useRef(true);
  useEffect(() => {
    if (!isFirst.current && document.activeElement === document.body) focusHeading();
    isFirst.current = false;
  }, [pathname]);
  return <Outlet />;
}

function focusHeading() {
  const heading = document.querySelector('h1');
  if (!heading) return;
  heading.tabIndex = -1;
  heading.focus({ preventScroll: true });
}

/** Remembers how far down each step of the history was scrolled. */
function useScrollPlaces(key: string) {
  const move = useNavigationType();
  const places = useRef(new Map<string, number>());
  useEffect(() => {
    window.history.scrollRestoration = 'manual';
  }, []);
  useLayoutEffect(() => {
    const known = places.current;
    if (move === 'PUSH') window.scrollTo(0, 0);
    if (move === 'POP') window.scrollTo(0, known.get(key) ?? 0);
    const note = () => known.set(key, window.scrollY);
    window.addEventListener('scroll', note, { passive: true });
    return () => window.removeEventListener('scroll', note);
  }, [key, move]);
}
