import { GoButton } from '../../../src/components/GoButton';
import { PageTitle } from '../../../src/components/PageTitle';
import { PasswordField, TextField } from '../../../src/components/TextField';
import { TextLink } from '../../../src/components/TextLink';

export function SignInPage() {
  return (
    <form className="flex flex-col gap-5">
      <PageTitle title="Sign in" />
      <TextField label="E-mail" type="email" autoComplete="username" />
      <PasswordField label="Password" error="E-mail and password do not belong together." />
      <GoButton type="submit" size="large" className="w-full">
        Sign in
      </GoButton>
      <p>
        <TextLink to="/forgotten">Forgotten your password?</TextLink>
      </p>
    </form>
  );
}
