/** A stored word as one of the known ones; an unknown one is a defect of the data. */
export function oneOf<Word extends string>(words: readonly Word[], stored: string): Word {
  const word = words.find((known) => known === stored);
  if (word === undefined) throw new Error(`a stored word is none of ${words.join(', ')}`);
  return word;
}
