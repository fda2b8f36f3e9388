import { readWhole } from './secrets.mjs';
import { say } from './say.mjs';

/** Counts what passed and failed, over all the tools. */
export class Tally {
  passed = 0;
  failed = 0;
  failures = [];

  check(title, isGood, output = '') {
    this.add(title, isGood ? { passed: 1, failures: [] } : { passed: 0, failures: [title] });
    if (!isGood) say(`\nFailed: ${title}\n${output.trim()}\n`);
  }

  add(title, { passed, failures }) {
    this.passed += passed;
    this.failed += failures.length;
    this.failures.push(...failures);
    say(`· ${title}: ${passed} passed, ${failures.length} failed`);
  }

  /** Prints the failures and, as the last line alone, the count. Answers the exit code. */
  print() {
    if (this.failed > 0) say(`\nFailed:\n${this.failures.map((title) => `  ${title}`).join('\n')}\n`);
    process.stdout.write(`${this.passed} passed, ${this.failed} failed\n`);
    return this.failed === 0 ? 0 : 1;
  }
}

/** A file that broke before its tests ran, and an error outside of any test, count as failures too. */
export function countVitest(file, code) {
  const files = readWhole(file)?.testResults ?? [];
  const tests = files.flatMap(({ assertionResults }) => assertionResults);
  const failures = tests.filter(({ status }) => status === 'failed').map(({ fullName }) => fullName);
  const broken = files.filter(
    (one) => one.status === 'failed' && !one.assertionResults.some(({ status }) => status === 'failed'),
  );
  failures.push(...broken.map(({ name }) => name));
  if (code !== 0 && failures.length === 0) failures.push('vitest ended with an error');
  return { passed: tests.filter(({ status }) => status === 'passed').length, failures };
}

export function countJourneys(file, code) {
  const specs = (readWhole(file)?.suites ?? []).flatMap(specsOf);
  const failures = specs.filter(({ ok }) => !ok).map(({ title }) => title);
  if (code !== 0 && failures.length === 0) failures.push('the browser tests ended with an error');
  return { passed: specs.filter(({ ok }) => ok).length, failures };
}

function specsOf(suite) {
  return [...(suite.specs ?? []), ...(suite.suites ?? []).flatMap(specsOf)];
}
