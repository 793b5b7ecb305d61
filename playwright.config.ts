import { defineConfig } from '@playwright/test';

/** Journeys through the built product in Debian's Chromium; the product is brought up once for the run. */
export default defineConfig({
  testDir: 'tests/browser',
  outputDir: 'test-results',
  globalSetup: './tests/support/setupBrowser.ts',
  // one browser at a time: two cores also run the product and its worker
  workers: 1,
  fullyParallel: false,
  timeout: 120_000,
  expect: { timeout: 15_000 },
  forbidOnly: true,
  reporter: 'list',
  use: {
    launchOptions: {
      executablePath: '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
        '--no-first-run',
        '--autoplay-policy=no-user-gesture-required',
      ],
    },
    actionTimeout: 20_000,
    trace: 'off',
  },
  projects: [
    { name: 'desktop', use: { viewport: { width: 1280, height: 800 } } },
    // one sets its widths itself, the other shows a desktop
    {
      name: 'phone',
      testIgnore: ['**/pages.spec.ts', '**/readme.spec.ts'],
      use: { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true },
    },
  ],
});
