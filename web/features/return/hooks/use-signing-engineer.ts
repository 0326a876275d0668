import { useState } from 'react';
import type { ReturnView } from '#shared/contracts/returns';
import { onlyOne } from '../../../lib/only-one';

export interface SigningEngineer {
  engineer: ReturnView['signingEngineers'][number] | null;
  chosen: string | null;
  choose: (id: string | null) => void;
}

/** Who would sign: the only one there is, else the one that is chosen. */
export function useSigningEngineer({ signingEngineers }: ReturnView): SigningEngineer {
  const [chosen, choose] = useState<string | null>(onlyOne(signingEngineers)?.id ?? null);
  return { engineer: signingEngineers.find(({ id }) => id === chosen) ?? null, chosen, choose };
}
