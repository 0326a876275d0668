import type { SearchResult } from '#shared/contracts/search';

const heads = { submittal: 'Submittals', project: 'Projects', clause: 'Clauses' } as const;

export function SearchResults({
  id,
  text,
  results,
  cursor,
  isLoading,
  failed,
  onFollow,
}: {
  id: string;
  text: string;
  results: readonly SearchResult[];
  cursor: number;
  isLoading: boolean;
  failed: boolean;
  onFollow: (result: SearchResult) => void;
}) {
  return (
    <div className="search-results" id={id} role="listbox" aria-label="Found">
      {results.map((result, index) => (
        <div key={`${result.kind}${result.href}`} role="presentation">
          {result.kind === results[index - 1]?.kind ? null : (
            <div className="menu-head" role="presentation">
              {heads[result.kind]}
            </div>
          )}
          <div
            id={`${id}-${index}`}
            className="search-result"
            role="option"
            tabIndex={-1}
            aria-selected={index === cursor}
            onMouseDown={(event) => event.preventDefault()}
            onClick={() => onFollow(result)}
            onKeyDown={(event) => {
              if (event.key === 'Enter') onFollow(result);
            }}
          >
            {result.title}
            <small>{result.detail}</small>
          </div>
        </div>
      ))}
      {results.length > 0 ? null : (
        <div className="search-state" role="status">
          {stateOf({ text, isLoading, failed })}
        </div>
      )}
    </div>
  );
}

function stateOf({ text, isLoading, failed }: { text: string; isLoading: boolean; failed: boolean }): string {
  if (failed) return 'The search did not answer. Change a letter to ask again.';
  if (isLoading) return 'Looking.';
  return `Nothing is called “${text.trim()}” among the mixes, projects and clauses you may see.`;
}
