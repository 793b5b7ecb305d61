import { Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { PageTitle } from '../components/PageTitle';
import { SignInForm } from '../features/account/SignInForm';
import { useMe } from '../lib/session';

export function SignInPage() {
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const back = ownPath(search.get('back'));
  if (useMe()) return <Navigate to={back} replace />;
  return (
    <div className="space-y-5">
      <PageTitle title="Sign in" />
      <SignInForm onDone={() => navigate(back, { replace: true })} />
      <p className="text-sm text-ink2">No account yet? The owner of your team sends you a link by mail.</p>
    </div>
  );
}

/** Only a path of our own is gone back to, never another site. */
const ownPath = (back: string | null) => (back && /^\/(?![/\\])/.test(back) ? back : '/');
