import type { Quantity } from '../../quantities/quantity';
import { convert } from '../../quantities/units';
import { type Domain, domainsOfQuantity } from '../words/context-words';
import type { Candidate } from './candidate';

export type FindQuantity = (id: string) => Quantity | undefined;

/** Which of the quantities that the headings may mean is meant; several where nothing on the sheet decides. */
export function resolveQuantities(candidate: Candidate, find: FindQuantity): Quantity[] {
  // A depth is a rut's and a deformation a flow only where the test is named.
  if (/(?:^|· )depth\b[^·]*$/i.test(candidate.heading) && !candidate.domains.includes('hamburg')) return [];
  if (
    /(?:^|· )d[ée]formaci?[oó]n\b[^·]*$/i.test(candidate.heading) &&
    candidate.quantities.includes('marshall-flow') &&
    !candidate.domains.includes('marshall')
  )
    return [];
  // So is a bare specific gravity the binder's only among the binder's tests.
  if (isBareGravity(candidate)) {
    return candidate.domains[0] === 'binder' ? candidate.quantities.flatMap((id) => find(id) ?? []) : [];
  }
  const all = ofField(ofReclaimed(candidate), candidate).flatMap((id) => find(id) ?? []);
  if (all.length <= 1) return all;
  const bySubset = ofSubset(all, candidate);
  if (bySubset.length <= 1) return bySubset;
  const byUnit = bySubset.filter(
    (quantity) => candidate.unit === null || convert(1, candidate.unit, quantity.unit).ok,
  );
  const units = byUnit.length > 0 ? byUnit : bySubset;
  if (units.length === 1) return units;
  return ofDomain(units, candidate.domains);
}

/** On a sheet about reclaimed material alone, its binder and its maximum gravity are not the mix's. */
function ofReclaimed({ quantities, domains, at, heading }: Candidate): string[] {
  const nearest = domains.find((domain) => domain === 'recycled' || domain === 'mix');
  const isReclaimed = nearest === 'recycled' && at.trial === undefined;
  if (!isReclaimed) return quantities;
  const isShingle = domains.includes('recycled') && /\bRAS\b|shingle/i.test(heading);
  return quantities.map((id) => {
    if (id === 'binder-content') return isShingle ? 'ras-binder-content' : 'rap-binder-content';
    return id === 'maximum-specific-gravity' && !isShingle ? 'rap-maximum-specific-gravity' : id;
  });
}

function isBareGravity({ quantities, heading }: Candidate): boolean {
  return (
    quantities.length === 1 &&
    quantities[0] === 'binder-specific-gravity' &&
    !/binder|bitum|asphalt|\bgb\b|\bac\b|liant|ligante|bet[uú]n|asfalto|bindemittel|\bc\.?a\.?\b/i.test(
      heading,
    )
  );
}

const inPlace: Partial<Record<string, string[]>> = {
  // A core may be cut to less than the layer: which of the two is meant is for a person to say.
  'specimen-thickness': ['specimen-thickness', 'lift-thickness'],
  'relative-density': ['field-density'],
  'air-voids': ['in-place-air-voids'],
};

/** Cores are cut from the pavement: their density, voids and thickness are the layer's. */
function ofField(quantities: string[], { domains, at }: Candidate): string[] {
  const nearest = domains.find((domain) => domain === 'field' || testsOfSpecimens.has(domain));
  if (nearest !== 'field' || at.gyrations !== undefined) return quantities;
  return [...new Set(quantities.flatMap((id) => inPlace[id] ?? [id]))];
}

const testsOfSpecimens: ReadonlySet<Domain> = new Set([
  'moisture',
  'marshall',
  'cracking',
  'hamburg',
  'creep',
  'modulus',
]);

function ofSubset(all: Quantity[], { subset, at }: Candidate): Quantity[] {
  const named = subset ?? (at.variant === 'dry' || at.variant === 'conditioned' ? at.variant : null);
  if (named === null || !all.some(({ id }) => id.startsWith('tensile-strength-'))) return all;
  const chosen = all.filter(({ id }) => id === `tensile-strength-${named}`);
  return chosen.length > 0 ? chosen : all;
}

/** The nearest words that speak for one of them only. */
function ofDomain(all: Quantity[], domains: Domain[]): Quantity[] {
  for (const domain of domains) {
    const fitting = all.filter(({ id }) => domainsOfQuantity[id]?.includes(domain));
    if (fitting.length === 1) return fitting;
  }
  return all;
}
