import { Navigate, Outlet } from 'react-router-dom';
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
