import type { Quantity } from '../quantities/quantity';
import type { Conditions, Reading } from '../record';

/** "Gmb, trial B, specimen 3 · measured, AASHTO T 166" */
export function readingInWords(reading: Reading, quantity: Pick<Quantity, 'symbol'>): string {
  const subject = [quantity.symbol, ...conditionsInWords(reading.at)].join(', ');
  const how = [reading.origin, ...(reading.method ? [reading.method] : [])].join(', ');
  return `${subject} · ${how}`;
}

export function conditionsInWords(at: Conditions): string[] {
  const words: string[] = [];
  if (at.trial !== undefined) words.push(at.trial === 'design' ? 'design' : `trial ${at.trial}`);
  if (at.blend !== undefined) words.push(`blend ${at.blend}`);
  if (at.stockpile !== undefined) words.push(`stockpile ${at.stockpile}`);
  if (at.specimen !== undefined) words.push(`specimen ${at.specimen}`);
  if (at.variant !== undefined) words.push(at.variant);
  if (at.sieve !== undefined) words.push(`${at.sieve} mm`);
  if (at.gyrations !== undefined) {
    words.push(`at ${at.gyrations} gyrations`);
  }
  if (at.temperature !== undefined) words.push(`${at.temperature} °C`);
  if (at.time !== undefined) words.push(`${at.time} s`);
  if (at.stress !== undefined) words.push(`${at.stress} kPa`);
  if (at.passes !== undefined) words.push(`${at.passes} passes`);
  if (at.frequency !== undefined) words.push(`${at.frequency} Hz`);
  if (at.aging !== undefined) words.push(at.aging);
  if (at.laboratory === 'agency') words.push('agency laboratory');
  return words;
}
