import { useQuery } from '@tanstack/react-query';
import { useDeferredValue, useId, useRef, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { SearchResult } from '#shared/contracts/search';
import { limits } from '#shared/limits';
import { Kbd } from '../../../components/ui/kbd';
import { searchQuery } from '../api/search';
import { searchFieldId } from '../focus-search';
import { SearchResults } from './search-results';

/** Finds submittals, projects and clauses as one types; arrows choose, Enter opens, Escape closes. */
export function SearchField() {
  const [text, setText] = useState('');
  const [open, setOpen] = useState(false);
  const [cursor, setCursor] = useState(0);
  const frame = useRef<HTMLDivElement>(null);
  const listId = useId();
  const navigate = useNavigate();
  const query = useQuery(searchQuery(useDeferredValue(text)));
  const results = text.trim() === '' ? [] : (query.data?.results ?? []);
  const shown = open && text.trim() !== '';

  const close = () => {
    setOpen(false);
    document.querySelector('.running-head')?.classList.remove('is-finding');
  };
  const follow = (result: SearchResult) => {
    close();
    setText('');
    navigate(result.href);
  };
  const onKeyDown = (event: React.KeyboardEvent) => {
    if (event.key === 'Escape') {
      close();
      if (event.target instanceof HTMLElement) event.target.blur();
      return;
    }
    const chosen = results[cursor];
    if (event.key === 'Enter' && chosen) follow(chosen);
    if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
    event.preventDefault();
    const step = event.key === 'ArrowDown' ? 1 : -1;
    setCursor((now) => Math.min(Math.max(0, now + step), Math.max(0, results.length - 1)));
  };
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: it only notices that the focus left the field and its list.
    <div
      className="head-search"
      ref={frame}
      onBlur={(event) => {
        if (!frame.current?.contains(event.relatedTarget)) close();
      }}
    >
      <input
        id={searchFieldId}
        type="search"
        role="combobox"
        aria-label="Find a mix, clause or project"
        aria-expanded={shown}
        aria-controls={listId}
        aria-autocomplete="list"
        aria-activedescendant={shown && results.length > 0 ? `${listId}-${cursor}` : undefined}
        placeholder="Find a mix, clause or project"
        maxLength={limits.searchCharacters}
        autoComplete="off"
        value={text}
        onFocus={() => setOpen(true)}
        onChange={(event) => {
          setText(event.target.value);
          setCursor(0);
          setOpen(true);
        }}
        onKeyDown={onKeyDown}
      />
      <Kbd hidden>/</Kbd>
      {shown ? (
        <SearchResults
          id={listId}
          text={text}
          results={results}
          cursor={cursor}
          isLoading={query.isPending}
          failed={query.isError}
          onFollow={follow}
        />
      ) : null}
    </div>
  );
}
