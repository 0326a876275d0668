import type { Tie } from '../lib/ties';

/** A lettered tie: shows its cell in the sheet beside. */
export function TieButton({ tie, onShow }: { tie: Tie; onShow: (tie: Tie) => void }) {
  return (
    <button
      type="button"
      className="tie tie-button"
      aria-label={`${tie.letter}: show ${tie.sheet === '' ? '' : `${tie.sheet} `}${tie.cell}`}
      onClick={() => onShow(tie)}
    >
      {tie.letter}
    </button>
  );
}
