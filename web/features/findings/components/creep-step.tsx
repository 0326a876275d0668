import { Link } from 'react-router-dom';
import type { Finding } from '#rules/engine/finding';
import { paths } from '../../../lib/paths';
import { useLedger } from './ledger-context';

/** Where the curve of a creep compliance is drawn, at the temperature that the rule names. */
export function CreepStep({ finding }: { finding: Pick<Finding, 'evidence'> }) {
  const { params, check } = useLedger();
  if (!check.hasCreep) return null;
  const temperature = finding.evidence[0]?.at?.temperature;
  return (
    <>
      <dt>Curve</dt>
      <dd>
        <Link to={paths.creep(params.submittalId, params.number, temperature)}>Points, curve and limits</Link>
      </dd>
    </>
  );
}
