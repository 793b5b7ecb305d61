import { Button } from './Button';

type Props = {
  /** an infinite query's own */
  query: {
    hasNextPage: boolean;
    isFetchingNextPage: boolean;
    isFetchNextPageError: boolean;
    fetchNextPage: () => unknown;
  };
  children?: string;
};

/** At the end of a list that has more pages. */
export function MoreButton({ query, children = 'Show more' }: Props) {
  if (!query.hasNextPage) return null;
  return (
    <div className="flex items-center gap-3 py-3">
      <Button busy={query.isFetchingNextPage ? 'Fetching' : undefined} onClick={() => query.fetchNextPage()}>
        {query.isFetchNextPageError ? 'Try again' : children}
      </Button>
      {query.isFetchNextPageError && (
        <span role="alert" className="text-sm font-bold text-danger">
          The rest did not arrive.
        </span>
      )}
    </div>
  );
}
