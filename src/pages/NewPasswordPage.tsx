import { useState } from 'react';
import { GoLink } from '../components/GoButton';
import { PageTitle } from '../components/PageTitle';
import { TextLink } from '../components/TextLink';
import { NewPasswordForm } from '../features/account/NewPasswordForm';
import { useSecret } from '../features/account/secret';

export function NewPasswordPage() {
  const secret = useSecret();
  const [state, setState] = useState<'asking' | 'done'>('asking');
  if (state === 'done')
    return (
      <div className="space-y-5">
        <PageTitle title="The password is set" />
        <p>You are signed out everywhere. Sign in with the new one.</p>
        <GoLink to="/sign-in">Sign in</GoLink>
      </div>
    );
  return (
    <div className="space-y-5">
      <PageTitle title="Choose a new password" />
      {secret === '' ? (
        <p>
          This page opens from the link in the mail. <TextLink to="/forgot-password">Send a new link</TextLink>
        </p>
      ) : (
        <NewPasswordForm secret={secret} onDone={() => setState('done')} />
      )}
    </div>
  );
}
