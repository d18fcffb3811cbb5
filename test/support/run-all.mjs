// npm test: everything from nothing, ending with the count. Node's own modules only: node_modules may be missing.
import { spawn } from 'node:child_process';
import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureChromium } from '../../server/local/chromium.mjs';
import { ensureDependencies } from '../../server/local/dependencies.mjs';
import { explain, log } from '../../server/local/log.mjs';
import { ensurePostgres } from '../../server/local/postgres-programs.mjs';

const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
const reports = path.join(root, 'reports');
const bin = (file) => path.join(root, 'node_modules', file);

const vitestCount = (report) => ({
  passed: report.numPassedTests,
  failed: report.numFailedTests + report.numPendingTests + report.numTodoTests,
});
const playwrightCount = ({ stats }) => ({
  passed: stats.expected,
  failed: stats.unexpected + stats.flaky + stats.skipped,
});

/** A skipped test counts as failed: the house has none. A stage without a report counts as one test. */
const STAGES = [
  { name: 'types of the libraries', args: [bin('typescript/bin/tsc'), '-p', 'libs/tsconfig.json'] },
  { name: 'types of the server', args: [bin('typescript/bin/tsc'), '-p', 'server/tsconfig.json'] },
  { name: 'types of the tests', args: [bin('typescript/bin/tsc'), '-p', 'tsconfig.tools.json'] },
  { name: 'lint', args: [bin('eslint/bin/eslint.js'), '.', '--max-warnings=0'] },
  { name: 'format', args: [bin('prettier/bin/prettier.cjs'), '--check', '--log-level=warn', '.'] },
  {
    name: 'libraries, server and API',
    args: [
      bin('vitest/vitest.mjs'),
      'run',
      '--reporter=default',
      '--reporter=json',
      '--outputFile.json=reports/vitest.json',
    ],
    report: 'vitest.json',
    count: vitestCount,
  },
  {
    name: 'client',
    args: [bin('@angular/cli/bin/ng.js'), 'test', '--watch=false', '--progress=false'],
    report: 'web.json',
    count: vitestCount,
  },
  { name: 'build', args: ['server/local/build.mjs'] },
  {
    name: 'browser',
    args: [bin('@playwright/test/cli.js'), 'test'],
    report: 'browser.json',
    count: playwrightCount,
  },
];

function run(args, env) {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, args, {
      cwd: root,
      stdio: ['ignore', 'inherit', 'inherit'],
      env: { ...process.env, NG_CLI_ANALYTICS: 'false', ...env },
    });
    for (const signal of ['SIGINT', 'SIGTERM']) process.once(signal, () => child.kill(signal));
    child.once('error', reject);
    child.once('exit', (code) => resolve(code ?? 1));
  });
}

/** Counts of one stage; a runner that failed without a failed test (or wrote no report) counts as one failure. */
async function runStage({ name, args, report, count }, env) {
  log(name);
  const code = await run(args, env);
  if (!report) return { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 };
  try {
    const { passed, failed } = count(JSON.parse(readFileSync(path.join(reports, report), 'utf8')));
    return { passed, failed: code !== 0 && failed === 0 ? 1 : failed };
  } catch (error) {
    log(`${name} left no report: ${error.message}`);
    return { passed: 0, failed: 1 };
  }
}

const total = { passed: 0, failed: 0 };
try {
  await ensureDependencies(root);
  ensurePostgres();
  const env = { CHROMIUM: ensureChromium() };
  rmSync(reports, { recursive: true, force: true });
  mkdirSync(reports);
  for (const stage of STAGES) {
    const { passed, failed } = await runStage(stage, env);
    log(`${stage.name}: ${passed} passed, ${failed} failed`);
    total.passed += passed;
    total.failed += failed;
  }
} catch (error) {
  log(explain(error));
  total.failed += 1;
}
process.stdout.write(`${total.passed} passed, ${total.failed} failed\n`);
process.exitCode = total.failed === 0 ? 0 : 1;
