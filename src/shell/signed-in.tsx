import { Navigate, Outlet, ScrollRestoration, useLocation } from 'react-router-dom';
import { useEffect, useRef } from 'react';
import { useMe } from '#src/replica/hooks.tsx';
import { homeFor } from '#src/shell/places.ts';

/** Everything for somebody who is signed in; others are sent to sign in. */
export function SignedIn() {
  const me = useMe();
  if (!me) return <Navigate to="/sign-in" replace />;
  // another person's screens begin anew, with nothing of the last one's in them
  return <Outlet key={me.personId} />;
}

/** Where a person arrives. */
export function Home() {
  const me = useMe();
  return <Navigate to={me ? homeFor(me.roles) : '/sign-in'} replace />;
}

/** Around every screen: after a move the page's heading has the focus, and a screen gone back to stands where it stood. */
export function Moves() {
  const { pathname } = useLocation();
  const isFirst = useRef(true);
  useEffect(() => {
    if (!isFirst.current && document.activeElement === document.body) focusHeading();
    isFirst.current = false;
  }, [pathname]);
  return (
    <>
      <Outlet />
      <ScrollRestoration />
    </>
  );
}

function focusHeading() {
  const heading = document.querySelector('h1');
  if (!heading) return;
  heading.tabIndex = -1;
  heading.focus({ preventScroll: true });
}
