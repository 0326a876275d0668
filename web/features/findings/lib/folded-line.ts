import type { Finding } from '#rules/engine/finding';
import { clauseParts } from '#shared/format/clause';
import { marginText } from '#shared/format/margin';
import { unitWord } from '#shared/format/units';
import type { LedgerRow } from './ledger';

/** "(a) (b) (c) pass with room; the closest is (b), coarse aggregate angularity, +2 %." */
export function foldedPassLine(rows: readonly LedgerRow[]): string {
  const findings = rows.map((row) => row.finding);
  const letters = [...new Set(findings.map(letterOf))];
  const sieves = findings.every((finding) => finding.kind === 'gradation');
  const who =
    sieves && letters.length === 1
      ? `${letters[0]} passes on ${listOf(findings.map((finding) => finding.subject))}`
      : `${letters.join(' ')} pass${findings.some(({ margin }) => margin === 0) ? '' : ' with room'}`;
  const closest = closestOf(findings);
  if (!closest) return `${who}.`;
  const name =
    sieves && letters.length === 1 ? closest.subject : `${letterOf(closest)}, ${lowerFirst(closest.title)}`;
  const unit = unitWord(closest.observed?.unit ?? '');
  return `${who}; the closest is ${name}, ${marginText(closest)}${unit === '' ? '' : ` ${unit}`}.`;
}

/** "(h) (i): recycled shingles, airfield." with each rule's own reason behind the fold. */
export function foldedNotApplicableLine(rows: readonly LedgerRow[]): string {
  const titles = [...new Set(rows.map(({ finding }) => lowerFirst(finding.title)))];
  const named = titles.slice(0, 6).join(', ');
  return `${named}${titles.length > 6 ? ` and ${titles.length - 6} more` : ''}.`;
}

/** Margins are compared in parts of what the gauge shows, as the eye would. */
export function closestOf(findings: readonly Finding[]): Finding | null {
  let best: { finding: Finding; share: number } | null = null;
  for (const finding of findings) {
    const room = roomOf(finding);
    // On the limit and still not borderline: the rule asks for exactly this, so it is not close to anything.
    if (!finding.margin || room === null) continue;
    const share = Math.abs(finding.margin) / room;
    if (!best || share < best.share) best = { finding, share };
  }
  return best?.finding ?? null;
}

function roomOf({ limit, gauge }: Finding): number | null {
  if (!limit) return null;
  if (limit.min !== null && limit.max !== null && limit.max > limit.min) return (limit.max - limit.min) / 2;
  return gauge?.span ?? null;
}

function letterOf(finding: Finding): string {
  if (finding.clause === null) return lowerFirst(finding.title);
  const { section, letter } = clauseParts(finding.clause);
  return letter === '' ? section : letter;
}

function listOf(words: readonly string[]): string {
  const units = new Set(words.map((word) => word.replace(/^[\d.]+/, '')));
  const short = units.size === 1 ? words.map((word) => word.replace(/[^\d.]+$/, '')) : [...words];
  const last = short.pop() ?? '';
  const unit = units.size === 1 ? ([...units][0] ?? '') : '';
  return `${short.length > 0 ? `${short.join(', ')} and ` : ''}${last}${unit}`;
}

export function lowerFirst(text: string): string {
  return /^[A-Z][a-z]/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text;
}
