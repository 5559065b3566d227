/**
 * A typed number, with a comma or a point as its decimal sign. Empty is null (never 0); what is not one
 * plain number is NaN, so that a form can say so instead of guessing.
 */
export const parseDecimal = (text: string): number | null => {
  const trimmed = text.trim().replace(/\u2212/g, '-');
  if (trimmed === '') return null;
  if (!/^-?(\d+([.,]\d*)?|[.,]\d+)$/.test(trimmed)) return Number.NaN;
  return Number(trimmed.replace(',', '.'));
};
