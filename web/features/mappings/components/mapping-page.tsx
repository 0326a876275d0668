import { useState } from 'react';
import { Link } from 'react-router-dom';
import { exportMapping, type MappingView } from '#shared/contracts/mappings';
import { dateOfInstant, formatDate } from '#shared/format/dates';
import { countInFigures } from '#shared/format/numbers';
import { Button } from '../../../components/ui/button';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { RichText } from '../../../components/ui/rich-text';
import { SectionHead } from '../../../components/ui/section-head';
import { TextField } from '../../../components/ui/text-field';
import { announce } from '../../../lib/announce';
import { hrefOf } from '../../../lib/api';
import { paths } from '../../../lib/paths';
import { asProblem } from '../../../lib/problem';
import { useSession } from '../../../lib/queries/session-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useChangeMapping, useMapping } from '../api/mappings';

/** One mapping: what it says, who taught it what and when, and what can be done with it. */
export function MappingPage({ mappingId }: { mappingId: string }) {
  const mapping = useMapping(mappingId);
  const { timeZone } = useSession();
  usePageTitle(mapping.name);
  const retired = mapping.retiredAt === null ? null : dateOfInstant(mapping.retiredAt, timeZone);
  return (
    <PlainPage>
      <PageHead
        kicker={
          <Link className="plain" to={paths.mappings}>
            Mappings
          </Link>
        }
        title={mapping.name}
        rest={`version ${mapping.number}, ${mapping.laboratory.name}`}
        lede={
          retired === null
            ? `Applied by itself to workbooks of its layout; ${countInFigures(mapping.usedBy, 'revision')} read with it.`
            : `Retired on ${formatDate(retired)}: no longer applied. Revisions that were read with it stay as they are.`
        }
      />
      {mapping.abilities.change ? <MappingActs key={mapping.version} mapping={mapping} /> : null}
      <SectionHead title="What it says" about={countInFigures(mapping.rules, 'rule')} />
      <ol className="ruled-lines">
        {mapping.sentences.map((sentence) => (
          <li key={sentence}>
            <RichText>{sentence}</RichText>
          </li>
        ))}
      </ol>
      <Versions mapping={mapping} timeZone={timeZone} />
    </PlainPage>
  );
}

function MappingActs({ mapping }: { mapping: MappingView }) {
  const [name, setName] = useState(mapping.name);
  const change = useChangeMapping(mapping);
  const isRetired = mapping.retiredAt !== null;
  const rename = () =>
    change.mutate({ name: name.trim() }, { onSuccess: (kept) => announce(`It is called ${kept.name}.`) });
  const retire = () =>
    change.mutate(
      { retired: !isRetired },
      {
        onSuccess: () =>
          announce(isRetired ? `${mapping.name} is in use again.` : `${mapping.name} is retired.`),
      },
    );
  return (
    <div className="form-column">
      {change.error ? (
        <ProblemNotice problem={asProblem(change.error)} unaffected="The mapping is as it was." />
      ) : null}
      <TextField
        label="Name"
        value={name}
        onChange={setName}
        error={name.trim() === '' ? 'Give a name.' : undefined}
      />
      <div className="acts py-2">
        <Button
          onPress={rename}
          isDisabled={name.trim() === '' || name.trim() === mapping.name}
          isPending={change.isPending}
        >
          Rename
        </Button>
        <Button onPress={retire} isPending={change.isPending}>
          {isRetired ? 'Take into use again' : 'Retire'}
        </Button>
        <a href={hrefOf(exportMapping, { params: { mappingId: mapping.id } })} download>
          Export
        </a>
      </div>
    </div>
  );
}

function Versions({ mapping, timeZone }: { mapping: MappingView; timeZone: string }) {
  return (
    <>
      <SectionHead title="Versions" about="newest first" />
      <table className="table table-stacked">
        <caption className="hidden-text">Versions of {mapping.name}</caption>
        <thead>
          <tr>
            <th scope="col">Version</th>
            <th scope="col" className="number">
              Rules
            </th>
            <th scope="col">From</th>
            <th scope="col">By</th>
            <th scope="col">On</th>
            <th scope="col">Document</th>
          </tr>
        </thead>
        <tbody>
          {mapping.versions.map(({ number, rules, origin, by, at }) => (
            <tr key={number}>
              <th scope="row">{number}</th>
              <td className="number">{rules}</td>
              <td>{origin}</td>
              <td>{by}</td>
              <td>{formatDate(dateOfInstant(at, timeZone))}</td>
              <td>
                <a
                  href={hrefOf(exportMapping, { params: { mappingId: mapping.id }, query: { number } })}
                  download
                  aria-label={`Export version ${number}`}
                >
                  Export
                </a>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}
