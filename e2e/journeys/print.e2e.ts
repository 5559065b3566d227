import { describe, expect } from 'vitest';
import { showcasePatient } from '../fixtures/accounts';
import { picture } from '../fixtures/picture';
import { test } from '../fixtures/test';

/** Pages of a PDF: each has one object of this type. */
const pagesOf = (pdf: Buffer): number => pdf.toString('latin1').match(/\/Type\s*\/Page\b(?!s)/g)?.length ?? 0;

describe('the printed summary', () => {
  test('fits one page of US Letter, with its chart and its caution and without the screen’s controls', async ({
    visit,
  }) => {
    const { page } = await visit({ as: 'pulmonologist' });
    await page.getByRole('searchbox').fill(showcasePatient.familyName);
    await page.getByRole('link', { name: new RegExp(showcasePatient.familyName) }).click();
    await page.getByRole('application').waitFor();
    await page.emulateMedia({ media: 'print' });
    expect(await page.getByRole('heading', { level: 1, name: showcasePatient.name }).isVisible()).toBe(true);
    expect(await page.getByRole('application').isVisible()).toBe(true);
    expect(await page.getByText('For licensed staff.').isVisible()).toBe(true);
    for (const name of ['Record', 'Show as table'])
      expect(await page.getByRole('button', { name, exact: true }).isVisible(), name).toBe(false);
    expect(await page.getByRole('navigation', { name: 'Areas' }).isVisible()).toBe(false);
    const pdf = await page.pdf({ format: 'Letter' });
    expect(pagesOf(pdf)).toBe(1);
    await picture(page, 'record-summary-print', { whole: true });
  });
});
