import { useState } from 'react';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import type { CreepCurveView } from '#shared/contracts/creep';
import { countOf, formatPlain } from '#shared/format/numbers';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { MarginPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { SectionHead } from '../../../components/ui/section-head';
import { paths } from '../../../lib/paths';
import { usePrintedRevision } from '../../../lib/print-frame';
import { useRevision } from '../../../lib/queries/revision-query';
import { useRevisionParams } from '../../../lib/revision-params';
import { useShortcuts } from '../../../lib/shortcuts';
import { usePageTitle } from '../../../lib/use-page-title';
import { useCreep } from '../api/get-creep';
import { chosenCurve, curveKey } from '../lib/chosen-curve';
import { CreepAside, type ModelName } from './creep-aside';
import { CreepChart } from './creep-chart';
import { CreepFindings, PointsTable } from './creep-tables';
import { MasterChart, ShiftTable } from './master-chart';
import '../creep.css';

export function CreepPage() {
  const params = useRevisionParams();
  const revision = useRevision(params);
  const creep = useCreep(params);
  const [search] = useSearchParams();
  const [asTable, setAsTable] = useState(false);
  const [showBand, setShowBand] = useState(true);
  const [wanted, setWanted] = useState<ModelName>('sigmoid');
  usePageTitle(`Creep compliance, ${revision.mixDesignation} revision ${revision.number}`);
  usePrintedRevision(revision);
  const back = paths.revision(params.submittalId, params.number);
  const navigate = useNavigate();
  const curve = chosenCurve(creep.curves, search);
  const fit = curve?.fits.find(({ model }) => model === wanted) ?? curve?.fits[0] ?? null;
  const models = curve?.fits.map(({ model }) => model) ?? [];
  const nextModel = models[(models.indexOf(fit?.model ?? 'sigmoid') + 1) % Math.max(1, models.length)];
  useShortcuts([
    { key: 'm', label: 'model', run: () => nextModel && setWanted(nextModel), foot: true },
    { key: 'b', label: 'band', run: () => setShowBand((now) => !now), foot: true },
    { key: 't', label: 'table', run: () => setAsTable((now) => !now), foot: true },
    { key: 'Escape', label: 'back', run: () => void navigate(back), foot: true },
  ]);
  return (
    <MarginPage
      marginWidthPx={300}
      aside={
        curve === null ? null : (
          <CreepAside
            curve={curve}
            fit={fit}
            model={fit?.model ?? wanted}
            onModel={setWanted}
            hasMaster={creep.master !== null}
          />
        )
      }
    >
      <PageHead
        kicker={
          <Link to={back}>
            {revision.mixDesignation} revision {revision.number}
          </Link>
        }
        title="Creep compliance"
        rest={curve === null ? '' : headOf(curve)}
        lede={revision.description}
      />
      {creep.curves.length > 1 ? <CurveLinks curves={creep.curves} chosen={curve} /> : null}
      {curve === null ? (
        <EmptyState title="The workbook states no creep test of the design.">
          <Link to={paths.reading(params.submittalId, params.number)}>See how it was read</Link>
        </EmptyState>
      ) : (
        <>
          {asTable || curve.points.length === 0 ? null : (
            <CreepChart curve={curve} fit={fit} showBand={showBand} params={params} />
          )}
          <div className="acts pt-2 pb-2">
            <Button kind="text" onPress={() => setAsTable(!asTable)}>
              {asTable ? 'Show as a chart' : 'Show as a table'}
            </Button>
            <Button kind="text" onPress={() => setShowBand(!showBand)} aria-pressed={showBand}>
              {showBand ? 'Hide the band' : 'Show the band'}
            </Button>
          </div>
          {asTable ? <PointsTable curve={curve} fit={fit} params={params} /> : null}
          <CreepFindings findings={curve.findings} revisionPath={back} />
        </>
      )}
      {creep.others.length > 0 ? (
        <>
          <SectionHead title="Asked for, and not tested" about={countOf(creep.others.length, 'rule')} />
          <CreepFindings findings={creep.others} revisionPath={back} />
        </>
      ) : null}
      {creep.master === null ? null : (
        <>
          <SectionHead
            title="Master curve"
            about={`at ${formatPlain(creep.master.referenceTemperature)} °C; for information, no rule is judged by it`}
          />
          {asTable ? null : <MasterChart master={creep.master} showBand={showBand} />}
          <ShiftTable master={creep.master} />
          {[...creep.master.fit.words, ...creep.master.problems].map((words) => (
            <p key={words} className="small">
              {words}
            </p>
          ))}
        </>
      )}
      <RunningFoot
        texts={[
          ...(creep.startingPoint ? [cautions.startingPoint] : []),
          cautions.findings,
          'A fitted or extrapolated value is marked as such wherever it appears.',
        ]}
      />
    </MarginPage>
  );
}

/** "at −10 °C under 200 kPa, AASHTO T 322, three specimens" */
function headOf({ temperature, stress, stresses, method, specimens }: CreepCurveView): string {
  const parts = [
    temperature === null ? 'at a temperature that is not stated' : `at ${formatPlain(temperature)} °C`,
    stress !== null
      ? `under ${formatPlain(stress)} kPa`
      : stresses.length > 1
        ? `under ${stresses.map((each) => formatPlain(each)).join(' and ')} kPa`
        : '',
  ].filter(Boolean);
  return [parts.join(' '), method, specimens.length > 0 ? countOf(specimens.length, 'specimen') : null]
    .filter(Boolean)
    .join(', ');
}

/** One link a temperature and stress; where they are chosen stands in the address. */
function CurveLinks({
  curves,
  chosen,
}: {
  curves: readonly CreepCurveView[];
  chosen: CreepCurveView | null;
}) {
  return (
    <nav className="order-toggle" aria-label="Temperature and stress">
      {curves.map((curve) => (
        <Link
          key={curveKey(curve)}
          to={{ search: curveKey(curve) }}
          aria-current={curve === chosen ? 'true' : undefined}
          preventScrollReset
          replace
        >
          {curve.temperature === null ? 'Temperature not stated' : `${formatPlain(curve.temperature)} °C`}
          {curve.stress !== null &&
          curves.some((other) => other !== curve && other.temperature === curve.temperature)
            ? `, ${formatPlain(curve.stress)} kPa`
            : ''}
        </Link>
      ))}
    </nav>
  );
}
