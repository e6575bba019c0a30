import { expect, test } from './harness';

test('the page opens under its own name and without a complaint', async ({ page }) => {
  await page.goto('/');
  await expect(page).toHaveTitle(/Pump Ceiling/);
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
});
