import { useMediaQuery } from './use-media-query';

/** The width at which gauges of a ledger are drawn for the room there is. */
export function useGaugeWidth(): 208 | 150 | 132 {
  const tiny = useMediaQuery('screen and (max-width: 379px)');
  const middle = useMediaQuery('print, screen and (min-width: 760px) and (max-width: 1199px)');
  if (tiny) return 132;
  return middle ? 150 : 208;
}
