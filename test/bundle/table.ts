import type { Bundle } from './bundle.js';

const kilobytes = (bytes: number): string => `${(bytes / 1000).toFixed(1)} kB`;

/** What an entry of test/bundle/entries is for. */
const USES: Readonly<Record<string, string>> = {
  folded: '`generalizedChebyshev`, `transversal`, `folded`',
  design: '`design`: specification checked, mask, certificates',
};

/** The table of sizes for the README, and what each bundle holds. */
export function sizeTable(bundles: readonly Bundle[]): string {
  const rows = bundles.map(
    ({ name, bytes, gzippedBytes }) => `| ${USES[name] ?? name} | ${kilobytes(bytes)} | ${kilobytes(gzippedBytes)} |`,
  );
  const contents = bundles.map(({ name, contents: all }) => {
    const parts = Object.entries(all).sort(([, a], [, b]) => b - a);
    return `${name}, before minification: ${parts.map(([place, bytes]) => `${place} ${kilobytes(bytes)}`).join(', ')}`;
  });
  return ['| imported | minified | gzipped |', '|---|---|---|', ...rows, '', ...contents].join('\n');
}
