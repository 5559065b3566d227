/** `spirometry-test.amend` as "Spirometry test, amend": the code of an action, made readable. */
export const actionWords = (action: string): string => {
  const words = action.replace(/[-_]/g, ' ').split(/[.:/]/).filter(Boolean).join(', ');
  return words.charAt(0).toUpperCase() + words.slice(1);
};
