import { useEffect, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { revisionStateSchema } from '#shared/contracts/submittals';
import { limits } from '#shared/limits';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { useProjects } from '../../../lib/queries/projects-query';
import { useSession } from '../../../lib/queries/session-query';
import type { SubmittalFilters } from '../api/list-submittals';

const restMilliseconds = 300;
const all = 'all';

/** Filters live in the address, so that a list can be kept and sent. */
export function SubmittalFilter({ filters }: { filters: SubmittalFilters }) {
  const [, setSearch] = useSearchParams();
  const { projects } = useProjects();
  const { active } = useSession();
  const [text, setText] = useState(filters.q ?? '');
  const set = (name: keyof SubmittalFilters, value: string) =>
    setSearch(
      (search) => {
        const next = new URLSearchParams(search);
        if (value === '' || value === all) next.delete(name);
        else next.set(name, value);
        return next;
      },
      { replace: true },
    );
  // biome-ignore lint/correctness/useExhaustiveDependencies: only typing searches.
  useEffect(() => {
    if (text === (filters.q ?? '')) return;
    const timer = setTimeout(() => set('q', text.trim()), restMilliseconds);
    return () => clearTimeout(timer);
  }, [text]);
  const states = revisionStateSchema.options.filter(
    (state) => active?.kind !== 'agency' || state !== 'draft',
  );
  return (
    <search className="submittal-filter">
      <TextField
        label="Mix or project"
        value={text}
        onChange={setText}
        maxLength={limits.searchCharacters}
        placeholder="part of a name or number"
      />
      <SelectField
        label="Stands at"
        choices={[
          { value: all, label: 'any state' },
          ...states.map((state) => ({ value: state, label: state })),
        ]}
        value={filters.state ?? all}
        onChange={(value) => set('state', value)}
      />
      <SelectField
        label="Project"
        choices={[
          { value: all, label: 'all projects' },
          ...projects.map(({ id, number, title }) => ({ value: id, label: `${number} ${title}` })),
        ]}
        value={filters.project ?? all}
        onChange={(value) => set('project', value)}
      />
    </search>
  );
}
