const { createCjsPreset } = require('jest-preset-angular/presets');

const swc = [
  '@swc/jest',
  {
    jsc: {
      parser: { syntax: 'typescript', decorators: true },
      transform: { legacyDecorator: true, decoratorMetadata: true },
      target: 'es2022',
    },
    module: { type: 'commonjs' },
  },
];

/** Packages that are ES modules only: Node can require them, jest has to translate them. */
const ESM_ONLY = [
  '@marcbachmann/cel-js',
  '@noble/hashes',
  'uuidv7',
  'canonicalize',
  'archiver',
  'idb',
  '@jsverse',
].join('|');

const plain = (displayName, testMatch) => ({
  displayName,
  rootDir: __dirname,
  testEnvironment: 'node',
  testMatch,
  transform: { '\\.m?[tj]s$': swc },
  transformIgnorePatterns: [`/node_modules/(?!(${ESM_ONLY})/)`],
  moduleNameMapper: { '^#shared/(.*)$': '<rootDir>/shared/$1' },
  moduleFileExtensions: ['ts', 'mjs', 'js', 'json'],
});

module.exports = {
  // Whole servers and browsers on two busy cores.
  testTimeout: 40_000,
  projects: [
    plain('shared', ['<rootDir>/shared/**/*.spec.ts']),
    {
      ...plain('backend', ['<rootDir>/backend/**/*.spec.ts']),
      setupFiles: ['reflect-metadata'],
    },
    {
      ...createCjsPreset({ tsconfig: '<rootDir>/frontend/tsconfig.spec.json' }),
      displayName: 'frontend',
      rootDir: __dirname,
      testMatch: ['<rootDir>/frontend/src/**/*.spec.ts'],
      setupFilesAfterEnv: ['<rootDir>/frontend/jest-setup.ts'],
      transformIgnorePatterns: [`/node_modules/(?!(${ESM_ONLY}|.*\\.mjs$)/?)`],
      moduleNameMapper: { '^#shared/(.*)$': '<rootDir>/shared/$1' },
    },
    { ...plain('e2e', ['<rootDir>/frontend/e2e/**/*.spec.ts']) },
  ],
};
