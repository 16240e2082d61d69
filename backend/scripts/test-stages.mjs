import fs from 'node:fs';
import path from 'node:path';
import { runTool } from './processes.mjs';
import { PROJECT_ROOT } from './paths.mjs';

/**
 * The checks that need nothing running, quick ones first.
 * @type {{ name: string, command: string[] }[]}
 */
export const STATIC_STAGES = [
  { name: 'Format', command: [process.execPath, 'node_modules/prettier/bin/prettier.cjs', '--check', '.'] },
  {
    name: 'Lint',
    command: [process.execPath, 'node_modules/eslint/bin/eslint.js', '.', '--max-warnings', '0'],
  },
  { name: 'Types', command: ['npm', 'run', 'types', '--silent'] },
];

/**
 * Runs a tool and shows what it prints.
 * @param {string[]} command
 * @param {Record<string, string>} [environment]
 * @returns {Promise<number>} its exit code
 */
export async function show([command, ...args], environment = {}) {
  const { code } = await runTool(command, args, {
    cwd: PROJECT_ROOT,
    env: { ...process.env, ...environment },
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  return code;
}

/**
 * Runs jest over all projects and reads its own account of it.
 * @param {string[]} extra what the person put behind `npm test --`
 * @param {Record<string, string>} environment
 * @param {string} temporary a folder that lives as long as the run
 * @returns {Promise<{ passed: number, failed: number }>}
 */
export async function runJest(extra, environment, temporary) {
  const outputFile = path.join(temporary, 'jest.json');
  const hasWorkers = extra.some((argument) =>
    /^(--maxWorkers|--max-workers|-w|-i|--runInBand)\b/.test(argument),
  );
  const code = await show(
    [
      process.execPath,
      'node_modules/jest/bin/jest.js',
      '--config',
      'jest.config.cjs',
      '--json',
      // A timer or socket left open in one library must not keep a finished run from ending.
      '--forceExit',
      `--outputFile=${outputFile}`,
      ...(hasWorkers ? [] : ['--maxWorkers=2']),
      ...extra,
    ],
    environment,
  );
  return countResults(outputFile, code);
}

/**
 * Counts what jest reports. A suite that could not run counts as one failure; a run that jest itself calls
 * failed never counts as zero failures, whatever the reason.
 * @param {string} outputFile
 * @param {number} code
 * @returns {{ passed: number, failed: number }}
 */
export function countResults(outputFile, code) {
  let passed = 0;
  let failed = 0;
  if (fs.existsSync(outputFile)) {
    const results = JSON.parse(fs.readFileSync(outputFile, 'utf8'));
    passed = results.numPassedTests;
    failed = results.numFailedTests + results.numRuntimeErrorTestSuites;
  }
  return { passed, failed: code !== 0 && failed === 0 ? 1 : failed };
}
