/**
 * Folds a name for searching and sorting: accents off, lower case, runs of white space to one blank.
 * `Álvaro  Núñez` becomes `alvaro nunez`.
 */
export function searchKey(text: string): string {
  return text
    .normalize('NFD')
    .replace(/\p{M}+/gu, '')
    .toLowerCase()
    .replace(/\s+/g, ' ')
    .trim();
}
