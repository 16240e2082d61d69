import { execFile } from 'node:child_process';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { beforeAll, describe, expect, it } from '@jest/globals';
import { PROJECT_FOLDER } from './project-folder';

/** A snippet, where it would stand, and what the linter has to say to it (`null`: nothing about layers). */
interface Snippet {
  readonly file: string;
  readonly code: string;
  readonly message: string | null;
}

const SHARED_ORDER = [
  ['units', 'failures/failure'],
  ['units', 'refrigeration/superheat'],
  ['failures', 'units/unit'],
  ['refrigeration', 'plant/ids'],
  ['plant', 'access/may'],
  ['plant', 'refrigeration/superheat'],
  ['access', 'checklist/step'],
  ['checklist', 'access/may'],
  ['checklist', 'sequences/entry'],
  ['sequences', 'contracts/session'],
] as const;

const importing = (path: string) => `import * as thing from '${path}';\nexport const a = thing;\n`;
const bad = (file: string, path: string, message: string): Snippet => ({
  file,
  code: importing(path),
  message,
});
const good = (file: string, path: string): Snippet => ({ file, code: importing(path), message: null });

const ORM = 'The ORM stays in';
const FOREIGN = 'Another feature is reached through its service';
const SCREENS = 'Screens run in a browser';
const PURE = 'shared/ is pure';
const FEATURE = 'A feature never imports another feature';
const MIGRATION = 'A migration must keep its meaning';
const UI = 'ui/ takes data and emits intent';

const FOLDERS: readonly Snippet[] = [
  ...SHARED_ORDER.map(([from, to]) => bad(`shared/${from}/x.ts`, `../${to}`, `shared/${from} may import`)),
  bad('shared/units/x.ts', '#shared/refrigeration/superheat', 'shared/units may import nothing else'),
  bad('shared/plant/x.ts', '../../backend/src/http/csrf', 'shared/ knows no server'),
  bad('shared/plant/x.ts', '../../frontend/src/app/openings/openings-api', 'shared/ knows no screen'),
  bad(
    'backend/src/plant/x.ts',
    '../../../frontend/src/app/openings/openings-api',
    'The server knows no screen',
  ),
  bad('frontend/src/app/work/x.ts', '../../../../backend/src/http/csrf', 'Screens reach the server through'),
  bad('frontend/src/app/work/x.ts', '../openings/openings-api', FEATURE),
  bad('frontend/src/app/openings/x.ts', '../reviews/reviews-api', FEATURE),
  bad('frontend/src/app/reviews/x.ts', '../packages/packages-api', FEATURE),
  bad('frontend/src/app/packages/x.ts', '../schedules/schedules-api', FEATURE),
  bad('frontend/src/app/schedules/x.ts', '../work/work-api', FEATURE),
  bad('frontend/src/app/refrigerants/x.ts', '../openings/openings-api', FEATURE),
  bad('frontend/src/app/ui/x.ts', '../session/session', UI),
  bad('frontend/src/app/ui/x.ts', '../work/work-api', UI),
  bad('backend/src/database/migrations/x.ts', '../../jobs/job.entity', MIGRATION),
  bad('backend/src/database/migrations/x.ts', '#shared/checklist/judge', MIGRATION),
];

const PACKAGES: readonly Snippet[] = [
  bad('shared/plant/x.ts', 'node:fs', PURE),
  bad('shared/plant/x.ts', '@angular/core', PURE),
  bad('shared/plant/x.ts', 'rxjs', PURE),
  bad('shared/plant/x.ts', 'express', PURE),
  bad('shared/plant/x.ts', 'typeorm', PURE),
  bad('backend/src/plant/x.ts', 'typeorm', ORM),
  bad('backend/src/plant/x.ts', '@angular/core', 'The server knows no Angular'),
  bad('frontend/src/app/work/x.ts', 'node:fs', SCREENS),
  bad('frontend/src/app/work/x.ts', 'express', SCREENS),
  bad('frontend/src/app/work/x.ts', 'typeorm', SCREENS),
  bad('frontend/src/app/work/x.ts', '@angular/common/http', 'HTTP belongs to'),
  bad('frontend/src/app/ui/x.ts', '@angular/common/http', 'HTTP belongs to'),
];

const LAYERS: readonly Snippet[] = [
  bad('backend/src/people/routes/x.route.ts', 'typeorm', ORM),
  bad('backend/src/people/routes/x.route.ts', 'express', 'Express stays in'),
  bad('backend/src/people/routes/x.route.ts', '../people.repository', 'Go through the feature'),
  bad('backend/src/people/routes/x.route.ts', '../person.entity', 'Entities stay behind'),
  bad('backend/src/people/x.service.ts', 'typeorm', ORM),
  bad('backend/src/people/x.service.ts', 'express', 'Express stays in'),
  bad('backend/src/people/x.service.ts', '../jobs/jobs.repository', FOREIGN),
  bad('backend/src/people/x.service.ts', '../jobs/job.entity', FOREIGN),
  bad('backend/src/templates/engine/x.service.ts', '../../jobs/jobs.repository', FOREIGN),
  bad('backend/src/people/x.repository.ts', 'express', 'Express stays in'),
  bad('backend/src/people/x.repository.ts', './people.service', 'A repository knows only its tables'),
  bad('backend/src/people/x.repository.ts', './routes/sign-in.route', 'A repository knows only its tables'),
];

const shape = (code: string, message: string, file = 'backend/src/people/x.ts'): Snippet => ({
  file,
  code: `${code}\n`,
  message,
});

const SHAPES: readonly Snippet[] = [
  shape("export * from './passwords';", 'No barrels'),
  shape("export * from './unit';", 'No barrels', 'shared/units/x.ts'),
  shape('export enum Colour { Copper }', 'array and its union'),
  shape("export const f = () => { throw new Error('no'); };", 'Throw a DomainFailure'),
  shape('export const f = (celsius: number) => celsius + 273.15;', 'Convert through shared/units'),
  // unit.ts stands under convert.ts, which imports it.
  shape(
    "import { toSi } from './convert';\nexport const UNITS = toSi;",
    'Dependency cycle',
    'shared/units/unit.ts',
  ),
];

const GOOD: readonly Snippet[] = [
  good('shared/contracts/x.ts', '../sequences/entry'),
  good('shared/sequences/x.ts', '#shared/checklist/step'),
  good('shared/units/x.ts', './unit'),
  good('backend/src/people/x.repository.ts', 'typeorm'),
  good('backend/src/people/x.entity.ts', 'typeorm'),
  good('backend/src/people/x.service.ts', './people.repository'),
  good('backend/src/people/x.service.ts', '../jobs/jobs.service'),
  good('backend/src/people/x.service.ts', '#shared/access/may'),
  good('backend/src/people/routes/x.route.ts', '../people.service'),
  good('backend/src/http/x.ts', 'express'),
  good('backend/src/database/migrations/x.ts', 'typeorm'),
  good('frontend/src/app/work/work-api.ts', '@angular/common/http'),
  good('frontend/src/app/work/x.ts', '../ui/date-of'),
  good('frontend/src/app/work/x.ts', '#shared/contracts/sequences'),
  shape('export const f = (celsius: number) => celsius + 273.15;', '', 'shared/units/x.ts'),
].map((snippet) => ({ ...snippet, message: null }));

/** ESLint loads its configuration as a module, which jest's own module loader can't: so it runs beside jest. */
const LINTER = `
import { ESLint } from 'eslint';
let input = '';
for await (const part of process.stdin) input += part;
const eslint = new ESLint({ cwd: process.cwd() });
const answers = [];
for (const { file, code } of JSON.parse(input)) {
  const [result] = await eslint.lintText(code, { filePath: file });
  answers.push(result.messages.map(({ ruleId, message }) => ({ ruleId, message })));
}
console.log(JSON.stringify(answers));`;

interface Message {
  readonly ruleId: string | null;
  readonly message: string;
}

async function lint(snippets: readonly Snippet[]): Promise<Message[][]> {
  const linter = promisify(execFile)(process.execPath, ['--input-type=module', '-e', LINTER], {
    cwd: PROJECT_FOLDER,
    timeout: 60_000,
  });
  linter.child.stdin?.end(
    JSON.stringify(snippets.map(({ file, code }) => ({ file: join(PROJECT_FOLDER, file), code }))),
  );
  return JSON.parse((await linter).stdout) as Message[][];
}

const ABOUT_LAYERS = /^(import-x\/|no-restricted-)|^null$/;
const ALL = [...FOLDERS, ...PACKAGES, ...LAYERS, ...SHAPES, ...GOOD];
const titled = (snippets: readonly Snippet[]) =>
  snippets.map((snippet) => ({ ...snippet, line: snippet.code.split('\n')[0] }));

describe('the linter', () => {
  const said = new Map<Snippet['code'], string[]>();
  const saidTo = ({ file, code }: Pick<Snippet, 'file' | 'code'>) =>
    said.get(`${file}\n${code}`) ?? ['not linted'];

  beforeAll(async () => {
    const answers = await lint(ALL);
    for (const [index, { file, code }] of ALL.entries()) {
      const about = (answers[index] ?? []).filter(({ ruleId }) => ABOUT_LAYERS.test(String(ruleId)));
      said.set(
        `${file}\n${code}`,
        about.map(({ message }) => message),
      );
    }
  }, 90_000);

  it.each(titled([...FOLDERS, ...PACKAGES, ...LAYERS, ...SHAPES]))('refuses in $file: $line', (snippet) => {
    expect(saidTo(snippet).join('\n')).toContain(snippet.message);
  });

  it.each(titled(GOOD))('lets pass in $file: $line', (snippet) => {
    expect(saidTo(snippet)).toEqual([]);
  });
});
