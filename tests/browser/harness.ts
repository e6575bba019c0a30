import { expect, test as base } from '@playwright/test';

/**
 * The test of all browser specs: the served page is the base address, and whatever the page complains about in
 * its console fails the test. A spec that provokes a complaint reads it from `complaints` and empties the list.
 */
export const test = base.extend<{ complaints: string[] }>({
  // The runner insists on a destructured first argument, even an empty one.
  baseURL: ({}, use) => use(process.env.PAGE_ADDRESS),
  complaints: [
    async ({ page }, use) => {
      const complaints: string[] = [];
      page.on('console', (message) => {
        if (message.type() === 'error') complaints.push(`${message.text()} (${message.location().url})`);
      });
      page.on('pageerror', (error) => complaints.push(String(error)));
      await use(complaints);
      expect(complaints, 'the page complains about nothing').toEqual([]);
    },
    { auto: true },
  ],
});

export { expect };
