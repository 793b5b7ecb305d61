import { ErrorPage } from '../../components/ErrorPage';
import { ErrorPanel } from '../../components/ErrorPanel';
import { GoLink } from '../../components/GoButton';
import { ApiError } from '../../lib/api';

type Props = { error: Error; listPath: string; onRetry: () => void; busy: string | undefined };

/** In place of a movement's page. */
export function MovementFault({ error, listPath, onRetry, busy }: Props) {
  if (error instanceof ApiError && error.code === 'notFound')
    return (
      <ErrorPage title="This movement is not here" actions={<GoLink to={listPath}>To the movements</GoLink>}>
        The address is wrong, or it belongs to another team.
      </ErrorPage>
    );
  return (
    <div className="pt-4">
      <ErrorPanel
        title="The movement did not arrive."
        message={error.message}
        requestId={error instanceof ApiError ? (error.requestId ?? undefined) : undefined}
        busy={busy}
        onRetry={onRetry}
      />
    </div>
  );
}
