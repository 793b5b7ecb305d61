import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { useMe } from '../lib/session';
import { OfflineNotice } from './OfflineNotice';

/** Pages for people who are signed in; others go to the sign-in page and come back. */
export function SignedIn() {
  const me = useMe();
  const { pathname, search } = useLocation();
  if (!me) return <Navigate to={`/sign-in?back=${encodeURIComponent(pathname + search)}`} replace />;
  return (
    <>
      <OfflineNotice />
      <Outlet />
    </>
  );
}
