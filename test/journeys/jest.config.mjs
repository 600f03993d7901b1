/** Journeys through the built product in real browsers, two at a time, each on a demo of its own. `npm test` names the browser in CHROME. */
import path from 'node:path';
import { findChromium } from '../support/find-chromium.mjs';

const chromium = findChromium();
if (!chromium) {
  throw new Error('The journeys need a browser: install Chromium, or set CHROME to its path.');
}
process.env.CHROME = chromium;

export default {
  displayName: 'journeys',
  rootDir: path.join(import.meta.dirname, '../..'),
  roots: ['<rootDir>/test/journeys'],
  globalSetup: '<rootDir>/test/journeys/start-demo.ts',
  globalTeardown: '<rootDir>/test/journeys/stop-demo.ts',
  testEnvironment: 'node',
  testEnvironmentOptions: { customExportConditions: ['underseam-source', 'node', 'node-addons'] },
  testMatch: ['**/*.spec.ts'],
  testTimeout: 120_000,
  testSequencer: path.join(import.meta.dirname, 'longest-first.mjs'),
  maxWorkers: 2,
  transform: {
    '^.+\\.ts$': ['@swc/jest', { jsc: { target: 'es2022', parser: { syntax: 'typescript' } } }],
  },
};
