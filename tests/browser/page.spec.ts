import AxeBuilder from '@axe-core/playwright';
import type { Page } from '@playwright/test';
import { expect, test } from './harness';

/** What the page offers under ?test=1. */
type TestWindow = Window & { pumpCeiling?: { endWorker: () => void } };

/** A first answer may take this long on a busy machine with two cores. */
const patience = 30_000;

const headline = (page: Page) => page.locator('.headline .figure');

async function open(page: Page, address = '/'): Promise<void> {
  await page.goto(address);
  await expect(headline(page)).toHaveText(/\d\s*W|none/, { timeout: patience });
}

/** The page has answered the design that is on it. */
async function settled(page: Page): Promise<void> {
  await expect(page.getByText(/band being computed|done in/)).toBeVisible({ timeout: patience });
}

test('the demo design is answered in watts on opening, with the limit named for every way of cooling', async ({
  page,
}) => {
  await open(page);
  await expect(headline(page)).toHaveText(/\d\s*W/);
  const board = page.getByRole('group', { name: /Ceiling of every way of cooling/ });
  await expect(board.locator('.word.main')).toHaveCount(6);
  for (const words of await board.locator('.word.main').allTextContents())
    expect(words).toMatch(/\d\s*W|none at any power/);
});

test('halving the pump radius changes the ceiling while it is typed', async ({ page }) => {
  await open(page);
  const before = await page.locator('.verdict .text').textContent();
  const board = page.getByRole('group', { name: /Ceiling of every way of cooling/ });
  const words = (await board.locator('.word.main').allTextContents()).join();
  await page.getByLabel('Pump radius', { exact: true }).fill('130 um');
  await expect
    .poll(async () => (await board.locator('.word.main').allTextContents()).join(), { timeout: patience })
    .not.toBe(words);
  await page.getByLabel('Pump power', { exact: true }).fill('5 W');
  await expect(page.locator('.verdict .text')).not.toHaveText(before ?? '', { timeout: patience });
});

test('a bare number is refused beside its field, the last good answer stays, and what was typed is kept', async ({
  page,
}) => {
  await open(page);
  const before = await headline(page).textContent();
  const field = page.getByLabel('Pump power', { exact: true });
  await field.fill('18');
  await expect(field).toHaveAttribute('aria-invalid', 'true');
  await expect(page.locator('#field-pump-power-fault')).toContainText(/unit/);
  await expect(page.getByText('This is the answer to the last good design.')).toBeVisible();
  await expect(headline(page)).toHaveText(before ?? '');
  await field.blur();
  await expect(field).toHaveValue('18');
  await field.fill('18 W');
  await expect(field).not.toHaveAttribute('aria-invalid', 'true');
});

test('undo and redo name the step and bring the value back', async ({ page }) => {
  await open(page);
  const field = page.getByLabel('Pump radius', { exact: true });
  await field.fill('300 um');
  await page.getByRole('button', { name: 'Undo pump radius' }).click();
  await expect(field).toHaveValue('260 um');
  await page.keyboard.press('Control+Shift+Z');
  await expect(field).toHaveValue('300 um');
});

test('the operating pump power moves with the arrow keys and the field follows', async ({ page }) => {
  await open(page);
  const line = page.getByRole('slider', { name: 'Operating pump power' });
  const before = Number(await line.getAttribute('aria-valuenow'));
  await line.focus();
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('Shift+ArrowRight');
  await expect.poll(async () => Number(await line.getAttribute('aria-valuenow'))).toBeGreaterThan(before);
  await expect(page.getByLabel('Pump power', { exact: true })).not.toHaveValue('18 W');
});

test('dragging the operating line answers on the way', async ({ page }) => {
  await open(page);
  await settled(page);
  const flag = page.locator('.flag');
  const box = (await flag.boundingBox())!;
  await page.mouse.move(box.x + 10, box.y + 8);
  await page.mouse.down();
  await page.mouse.move(box.x - 150, box.y + 8, { steps: 6 });
  await page.mouse.up();
  await expect(page.getByLabel('Pump power', { exact: true })).not.toHaveValue('18 W');
  await settled(page);
});

test('the end mirror moves with the arrow keys and its space follows', async ({ page }) => {
  await open(page);
  await page.getByText('Cavity elements').click();
  const space = page.locator('#field-cavity-elements-3-space');
  const before = Number.parseFloat(await space.inputValue());
  await page.getByRole('slider', { name: /Mirror 2/ }).focus();
  await page.keyboard.press('Shift+ArrowRight');
  await expect(space).toHaveValue(`${before + 10} mm`);
});

test('reading one chart with the arrow keys reads all charts of the sweep at the same pump power', async ({
  page,
}) => {
  await open(page);
  await page.getByRole('slider', { name: /^Peak temperature/ }).focus();
  await page.keyboard.press('Home');
  await page.keyboard.press('Shift+ArrowRight');
  const readings = await page
    .locator('#sweeps [role=slider]')
    .evaluateAll((charts) => charts.map((chart) => chart.getAttribute('aria-valuenow')));
  expect(new Set(readings)).toEqual(new Set(['10']));
});

test('choosing a way of cooling and a mount changes the design', async ({ page }) => {
  await open(page);
  await page.getByRole('button', { name: /^water/ }).click();
  await expect(page.locator('.headline .label')).toContainText(/water/i, { timeout: patience });
  await page.locator('#mount').getByRole('button', { name: /brass/ }).click();
  await expect(page.getByLabel('Mount material')).toHaveValue(/brass/);
});

test('the rod section is read with the arrow keys, and the beam can be blocked', async ({ page }) => {
  await open(page);
  const section = page.getByRole('slider', { name: /Temperature over the section/ });
  await section.focus();
  const before = await section.getAttribute('aria-valuetext');
  await page.keyboard.press('Shift+ArrowRight');
  await expect(section).not.toHaveAttribute('aria-valuetext', before ?? '');
  await page.getByRole('button', { name: 'beam blocked' }).click();
  await expect(page.getByRole('button', { name: 'beam blocked' })).toHaveAttribute('aria-pressed', 'true');
});

test('the theme can be chosen against that of the system', async ({ page }) => {
  await page.emulateMedia({ colorScheme: 'light' });
  await open(page);
  await page.getByRole('button', { name: 'Dark page' }).click();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark');
  await page.reload();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark');
});

test('parts of the cavity and coolers can be added and taken away, and undone', async ({ page }) => {
  await open(page);
  await page.getByText('Cavity elements').click();
  await page.locator('#cavity').getByRole('button', { name: 'lens', exact: true }).click();
  await expect(page.getByRole('textbox', { name: 'Focal length' })).toHaveValue('200 mm');
  await page.getByRole('button', { name: 'Undo add lens' }).click();
  await expect(page.getByRole('textbox', { name: 'Focal length' })).toHaveCount(0);
  await page.getByText('ways of cooling, sizes and supplies').click();
  await page.getByRole('button', { name: 'plain K/W' }).click();
  await expect(page.getByRole('group', { name: /Ceiling of every way/ }).locator('.word.main')).toHaveCount(
    7,
    { timeout: patience },
  );
});

test('a worker that dies is started again and the page says so', async ({ page }) => {
  await open(page, '/?test=1');
  await page.getByLabel('Pump radius', { exact: true }).fill('280 um');
  await page.waitForFunction(() => document.body.innerText.includes('computing'));
  await page.evaluate(() => (window as TestWindow).pumpCeiling?.endWorker());
  await expect(page.getByText(/it was restarted/)).toBeVisible();
  await settled(page);
});

test('a file that is no design is refused in words and the present design stays', async ({ page }) => {
  await open(page);
  await page
    .locator('input[type=file]')
    .setInputFiles({ name: 'notes.json', mimeType: 'application/json', buffer: Buffer.from('{"a":') });
  await expect(page.getByRole('alert').filter({ hasText: 'notes.json was not opened' })).toContainText(
    'not valid JSON',
  );
  await expect(page.getByLabel('Pump radius', { exact: true })).toHaveValue('260 um');
});

test('a saved file opens again as the same design', async ({ page }) => {
  await open(page);
  await page.getByLabel('Pump radius', { exact: true }).fill('310 um');
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Save file' }).click(),
  ]);
  await page.getByLabel('Pump radius', { exact: true }).fill('200 um');
  await page.locator('input[type=file]').setInputFiles(await download.path());
  await expect(page.getByLabel('Pump radius', { exact: true })).toHaveValue('310 um');
});

for (const width of [360, 768, 1440, 2560])
  test(`at ${width} pixels nothing runs over the side, and nothing is asked of another host`, async ({
    page,
    baseURL,
  }) => {
    const outside: string[] = [];
    page.on('request', (request) => {
      if (!request.url().startsWith(baseURL!) && !/^(data|blob):/.test(request.url()))
        outside.push(request.url());
    });
    await page.setViewportSize({ width, height: 900 });
    await open(page);
    const over = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
    expect(over).toBeLessThanOrEqual(0);
    expect(await page.evaluate(() => document.body.innerText)).not.toMatch(/\bNaN\b|undefined|Infinity/);
    expect(outside).toEqual([]);
  });

for (const colorScheme of ['light', 'dark'] as const)
  test(`no serious fault of accessibility, ${colorScheme}`, async ({ page }) => {
    await page.emulateMedia({ colorScheme });
    await open(page);
    for (const summary of await page.locator('summary').all())
      if (await summary.isVisible()) await summary.click();
    await settled(page);
    const { violations } = await new AxeBuilder({ page }).analyze();
    const grave = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
    expect(
      grave.map(
        ({ id, nodes }) =>
          `${id}: ${nodes
            .slice(0, 3)
            .map((node) => node.html)
            .join(' | ')}`,
      ),
    ).toEqual([]);
  });
