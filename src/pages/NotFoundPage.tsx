import { ErrorPage } from '../components/ErrorPage';
import { GoLink } from '../components/GoButton';

export function NotFoundPage() {
  return (
    <ErrorPage title="There is nothing here" actions={<GoLink to="/">To your team</GoLink>}>
      The address is wrong, or what was here has moved.
    </ErrorPage>
  );
}
