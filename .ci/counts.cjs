// Adds up the two test reports of a folder and prints the true counts alone on the last line.
const { readFileSync } = require('node:fs');
const [folder, status] = process.argv.slice(2);

/** Full names of the tests that have passed under Node: one that needs a process may be left out in a page. */
const passedUnderNode = new Set();

function countsOf(name) {
  let report;
  try {
    report = JSON.parse(readFileSync(`${folder}/${name}.json`, 'utf8'));
  } catch {
    console.log(`no report was written: ${name}`);
    return { passed: 0, failed: 0, skipped: 0, isWhole: false };
  }
  const tests = report.testResults.flatMap(({ assertionResults }) => assertionResults);
  const isExpected = ({ fullName }) => name === 'chromium' && passedUnderNode.has(fullName);
  const skipped = tests.filter((test) => test.status !== 'passed' && test.status !== 'failed' && !isExpected(test));
  if (name === 'node') for (const { fullName, status: end } of tests) if (end === 'passed') passedUnderNode.add(fullName);
  for (const { fullName } of skipped) console.log(`skipped, though every tool is installed here: ${fullName}`);
  // A suite that did not load has no failed test of its own, but it is a failure.
  const failed = Math.max(report.numFailedTests, report.numFailedTestSuites > 0 ? 1 : 0);
  const passed = report.numPassedTests;
  console.log(`${name}: ${passed} passed, ${failed} failed`);
  return { passed, failed, skipped: skipped.length, isWhole: passed > 0 };
}

const all = ['node', 'chromium'].map(countsOf);
const sum = (key) => all.reduce((total, counts) => total + counts[key], 0);
const [passed, failed, skipped] = [sum('passed'), sum('failed'), sum('skipped')];
const isGood = status === '0' && failed === 0 && skipped === 0 && all.every(({ isWhole }) => isWhole);
if (!isGood) console.log(`not good: exit status ${status}`);
console.log(`${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`);
process.exitCode = isGood ? 0 : 1;
