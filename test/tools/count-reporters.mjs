// Reporters that leave the number of passed and failed tests in a file, for the total over both kinds of test.
import { writeFileSync } from 'node:fs';

/** For node:test: yields one line of JSON at the end. */
export default async function* nodeCounts(events) {
  const totals = {};
  for await (const { type, data } of events) {
    const [, name, number] = (type === 'test:diagnostic' && /^(pass|fail|cancelled) (\d+)$/.exec(data.message)) || [];
    if (name) totals[name] = Number(number);
  }
  yield JSON.stringify({ passed: totals.pass ?? 0, failed: (totals.fail ?? 0) + (totals.cancelled ?? 0) });
}

/** For Web Test Runner: writes the same JSON to the file that COUNTS_FILE names; a run of no test fails. */
export function browserCounts() {
  return {
    onTestRunFinished({ sessions }) {
      const counts = { passed: 0, failed: 0 };
      const walk = ({ tests, suites }) => {
        for (const test of tests) if (!test.skipped) counts[test.passed ? 'passed' : 'failed']++;
        suites.forEach(walk);
      };
      for (const session of sessions) {
        if (session.testResults) walk(session.testResults);
        if (!session.passed && session.errors?.length) counts.failed++;
      }
      if (process.env.COUNTS_FILE) writeFileSync(process.env.COUNTS_FILE, JSON.stringify(counts));
      if (counts.passed === 0) process.once('exit', () => { process.exitCode = 1; });
    },
  };
}
