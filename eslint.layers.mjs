// The layout table of DEVELOPERS.md as lint rules: arrows point down the list only. A spec lints one bad snippet for
// each row and expects its message, because a rule whose paths don't resolve reports nothing at all.

/** The order of shared/: each folder may import those that stand before it on its own line. */
const SHARED = {
  units: [],
  failures: [],
  refrigeration: ['units', 'failures'],
  plant: ['units', 'failures'],
  access: ['plant'],
  checklist: ['units', 'failures', 'plant', 'refrigeration'],
  sequences: ['units', 'failures', 'plant', 'access', 'checklist'],
  contracts: ['units', 'failures', 'plant', 'refrigeration', 'access', 'checklist', 'sequences'],
};

const FRONTEND_FEATURES = [
  'openings',
  'schedules',
  'reviews',
  'packages',
  'refrigerants',
  'work',
  'defrosts',
];

/** Zones for import-x/no-restricted-paths, which looks at the file that an import really means. */
export function folderZones() {
  const zones = [
    { target: './shared', from: './frontend', message: 'shared/ knows no screen.' },
    { target: './shared', from: './backend', message: 'shared/ knows no server.' },
    { target: './backend', from: './frontend/src', message: 'The server knows no screen.' },
    {
      target: './frontend/src',
      from: './backend',
      message: 'Screens reach the server through shared/contracts only.',
    },
  ];
  for (const [folder, allowed] of Object.entries(SHARED)) {
    zones.push({
      target: `./shared/${folder}`,
      from: './shared',
      except: [folder, ...allowed].map((name) => `./${name}`),
      message: `shared/${folder} may import ${allowed.join(', ') || 'nothing else of ours'}.`,
    });
  }
  for (const feature of FRONTEND_FEATURES) {
    zones.push({
      target: `./frontend/src/app/${feature}`,
      from: './frontend/src/app',
      except: [feature, 'ui', 'session', 'offline', 'shell'].map((name) => `./${name}`),
      message: 'A feature never imports another feature: what two need belongs to ui/ or shared/.',
    });
  }
  zones.push({
    target: './frontend/src/app/ui',
    from: './frontend/src/app',
    except: ['./ui'],
    message: 'ui/ takes data and emits intent; it knows no store.',
  });
  zones.push({
    target: './backend/src/database/migrations',
    from: './backend/src',
    except: ['./database/migrations'],
    message: 'A migration must keep its meaning: it imports nothing of ours.',
  });
  zones.push({
    target: './backend/src/database/migrations',
    from: './shared',
    message: 'A migration must keep its meaning: it imports nothing of ours.',
  });
  return zones;
}

const ORM = {
  group: ['typeorm', 'typeorm/*'],
  message: 'The ORM stays in *.entity.ts, *.repository.ts and database/.',
};
const EXPRESS = {
  group: ['express', 'express/*'],
  message: 'Express stays in http/, app/ and the session door.',
};
const REPOSITORY = { group: ['**/*.repository'], message: 'Go through the feature’s service.' };
const ENTITY = { group: ['**/*.entity'], message: 'Entities stay behind the repository.' };
const FOREIGN_TABLES = {
  group: ['../**/*.repository', '../**/*.entity'],
  message: 'Another feature is reached through its service.',
};
const ANGULAR = { group: ['@angular/*'], message: 'The server knows no Angular.' };

/** Package and layer bans by the written path; built by one function, since a later block replaces a rule's options. */
export function layerBans() {
  const ban = (files, patterns, ignores = []) => ({
    files,
    ignores,
    rules: { 'no-restricted-imports': ['error', { patterns }] },
  });
  const specs = ['**/*.spec.ts', '**/*.fixture.ts', '**/testing/**'];
  return [
    ban(
      ['shared/**/*.ts'],
      [
        {
          group: ['node:*', '@angular/*', 'rxjs', 'rxjs/*', 'express', 'typeorm', '@jsverse/*'],
          message: 'shared/ is pure: no DOM, Node, Angular or ORM.',
        },
      ],
      specs,
    ),
    ban(
      ['backend/src/**/*.ts'],
      [ORM, ANGULAR, EXPRESS],
      [
        ...specs,
        '**/*.repository.ts',
        '**/*.entity.ts',
        'backend/src/database/**',
        'backend/src/app/**',
        'backend/src/http/**',
        'backend/src/people/session-door.ts',
        'backend/src/people/access-desk.ts',
      ],
    ),
    ban(['backend/src/**/*.route.ts'], [ORM, EXPRESS, ANGULAR, REPOSITORY, ENTITY]),
    // A live event stream is a response that stays open: that service alone holds one.
    ban(['backend/src/**/*.service.ts'], [ORM, EXPRESS, ANGULAR, FOREIGN_TABLES], ['backend/src/events/**']),
    ban(['backend/src/events/**/*.service.ts'], [ORM, ANGULAR, FOREIGN_TABLES]),
    ban(
      ['backend/src/**/*.repository.ts'],
      [
        EXPRESS,
        ANGULAR,
        { group: ['**/*.service', '**/*.route'], message: 'A repository knows only its tables.' },
      ],
    ),
    ban(
      ['frontend/src/**/*.ts'],
      [
        { group: ['node:*', 'express', 'typeorm', '**/backend/**'], message: 'Screens run in a browser.' },
        { group: ['@angular/common/http'], message: 'HTTP belongs to *-api.ts.' },
      ],
      [
        ...specs,
        '**/*-api.ts',
        '**/*interceptor.ts',
        'frontend/src/app/app.config.ts',
        '**/problem-of.ts',
        '**/*-context.ts',
      ],
    ),
  ];
}

/** Shapes of code that are out, each with what to write instead. */
export function syntaxBans() {
  return [
    ...shapeBans(),
    {
      selector: 'Literal[value=273.15]',
      message: 'Convert through shared/units: factors live there alone.',
    },
  ];
}

/** Those that hold in shared/units too. */
export function shapeBans() {
  return [
    { selector: 'ExportAllDeclaration', message: 'No barrels: import the file that defines the thing.' },
    { selector: 'TSEnumDeclaration', message: 'Use an `as const` array and its union.' },
    {
      selector:
        'ThrowStatement > :matches(NewExpression, CallExpression)[callee.name=/^(Error|TypeError|RangeError)$/]',
      message: 'Throw a DomainFailure, a TemporaryFailure or a Bug.',
    },
  ];
}
