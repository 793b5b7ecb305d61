import { useRouteError } from 'react-router-dom';
import { Button } from '../components/Button';
import { ErrorPage } from '../components/ErrorPage';
import { GoLink } from '../components/GoButton';
import { ApiError } from '../lib/api';
import { PlainLayout } from './layouts/PlainLayout';

/** Where a page's errors end up: what it could not load, or what broke in it. */
export function PageFault() {
  const error = useRouteError();
  const again = <Button onClick={() => location.reload()}>Load the page again</Button>;
  const home = <GoLink to="/">To your team</GoLink>;
  return (
    <PlainLayout>
      {error instanceof ApiError && (error.code === 'notFound' || error.code === 'invalid') ? (
        <ErrorPage title="There is nothing here" actions={home}>
          {error.code === 'notFound' ? error.message : 'The address is wrong.'}
        </ErrorPage>
      ) : error instanceof ApiError && error.code === 'notAllowed' ? (
        <ErrorPage title="This page is not for your role" actions={home}>
          {error.message} The owner can give you another one.
        </ErrorPage>
      ) : isOldPage(error) ? (
        <ErrorPage title="Tapeline was updated meanwhile" actions={again}>
          This page is from before. Load it again to go on; nothing that was saved is lost.
        </ErrorPage>
      ) : error instanceof ApiError ? (
        <ErrorPage
          title="The page did not arrive"
          requestId={error.requestId ?? undefined}
          actions={
            <>
              {again}
              {home}
            </>
          }
        >
          {error.message}
        </ErrorPage>
      ) : (
        <ErrorPage
          title="Something broke on this page"
          actions={
            <>
              {again}
              {home}
            </>
          }
        >
          Nothing that was saved is lost. If it happens again, tell the owner what you did.
        </ErrorPage>
      )}
    </PlainLayout>
  );
}

/** A page's code that is not there any more under its old name, or could not be fetched. */
function isOldPage(error: unknown): boolean {
  return error instanceof TypeError && /import|module script/i.test(error.message);
}
