import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import type { ResolvedRule } from '../rule-sets/resolve';
import type { ResolvedLimit } from './finding';
import { type Rounder, rounderOf } from './judge';
import { resolveLimit } from './resolve-limit';
import type { RoomToMove } from './room';
import { type Side, sideOf } from './side-of-limit';
import type { World } from './world';

/** What is known of the mix before a finding is looked at. */
export interface Asked {
  world: World;
  room: RoomToMove | null;
}

/** The limit and the rounding that a value is held to. */
export interface Judging {
  world: World;
  limit: ResolvedLimit;
  rounder: Rounder;
  /** Unit that the value comes in. */
  own: string;
}

/** Null where the rule sets no limit in numbers for this mix. `own` is the value's unit, else the limit's. */
export function judgingOf(
  world: World,
  rule: ResolvedRule,
  at: Conditions,
  own: string | undefined,
): Judging | null {
  const limit = resolveLimit(world, rule, at);
  if (!limit.ok || (limit.limit.min === null && limit.limit.max === null)) return null;
  const rounding = rounderOf(world, rule, limit.limit, at);
  if (!rounding.ok) return null;
  return { world, limit: limit.limit, rounder: rounding.rounder, own: own ?? limit.limit.unit };
}

export function sideIn({ limit, rounder, own }: Judging, value: number | null): Side {
  const converted = value === null ? null : convert(value, own, limit.unit);
  return sideOf(converted?.ok ? converted.value : null, limit, rounder);
}
