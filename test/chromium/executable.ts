import { existsSync } from 'node:fs';

const named = process.env.IRISLOOM_CHROMIUM;

/** Where Debian and others put Chromium; the variable names another place instead. */
const PLACES: readonly string[] = named === undefined ? ['/usr/bin/chromium', '/usr/bin/chromium-browser'] : [named];

/** The installed Chromium; undefined where there is none, and tests that need it are skipped. `.ci/run` fails on such a skip. */
export const CHROMIUM: string | undefined = PLACES.find((place) => existsSync(place));

/** No window, no sandbox (containers have none), and nothing of its own over the network. */
export const CHROMIUM_ARGUMENTS: readonly string[] = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--hide-scrollbars',
];
