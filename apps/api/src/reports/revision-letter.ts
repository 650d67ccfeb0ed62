/** The letter after a revision's letter: A, B … Z, AA, AB …, as columns are lettered. */
export function nextRevisionLetter(letter: string): string {
  const last = letter.at(-1);
  if (last === undefined) return 'A';
  const before = letter.slice(0, -1);
  return last === 'Z' ? `${nextRevisionLetter(before)}A` : `${before}${String.fromCharCode(last.charCodeAt(0) + 1)}`;
}
