/** a, b, … z, aa, ab, …: the tie between a doubt on the sheet and its question beside it. */
export function doubtLetter(index: number): string {
  const letter = String.fromCharCode(97 + (index % 26));
  return index < 26 ? letter : doubtLetter(Math.floor(index / 26) - 1) + letter;
}
