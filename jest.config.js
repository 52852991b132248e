const alias = { '^@/(.*)$': '<rootDir>/$1' };

/** Babel for code that runs in Node: no project-wide Babel file is read. */
const nodeTransform = {
  '\\.[cm]?[jt]sx?$': [
    'babel-jest',
    {
      babelrc: false,
      configFile: false,
      presets: [
        ['@babel/preset-env', { targets: { node: 'current' } }],
        ['@babel/preset-typescript', { allowDeclareFields: true }],
      ],
    },
  ],
};

/** Babel for the client, told that it serves the web bundle as Metro would. */
const webTransform = {
  '\\.[jt]sx?$': [
    'babel-jest',
    {
      babelrc: false,
      configFile: false,
      presets: ['babel-preset-expo'],
      // What a page fetches when it first needs it is an ordinary require here.
      plugins: ['@babel/plugin-transform-dynamic-import'],
      caller: { name: 'metro', bundler: 'metro', platform: 'web' },
    },
  ],
  '\\.(woff2|png|svg)$': require.resolve('jest-expo/src/preset/assetFileTransformer.js'),
};

const nodeProject = (displayName, folders, more = {}) => ({
  displayName,
  rootDir: __dirname,
  testEnvironment: 'node',
  testMatch: folders.map((folder) => `<rootDir>/tests/${folder}/**/*.test.ts`),
  moduleNameMapper: alias,
  transform: nodeTransform,
  modulePathIgnorePatterns: ['<rootDir>/dist/', '<rootDir>/.data/'],
  ...more,
});

module.exports = {
  // The first render and the first database of a file are slow on a busy machine.
  testTimeout: 60_000,
  projects: [
    nodeProject('numerics', ['numerics', 'checks', 'formulas', 'systems', 'reference']),
    nodeProject('contract', ['contract']),
    nodeProject('server', ['server'], {
      globalSetup: '<rootDir>/tests/support/global-setup.js',
      globalTeardown: '<rootDir>/tests/support/global-teardown.js',
      // The library that reads citations back fetches through packages of ES modules.
      transformIgnorePatterns: [
        '/node_modules/(?!(?:.*/)?(?:node-fetch|data-uri-to-buffer|fetch-blob|formdata-polyfill)/)',
      ],
    }),
    {
      displayName: 'features',
      rootDir: __dirname,
      preset: 'jest-expo/web',
      setupFilesAfterEnv: ['<rootDir>/tests/support/patience.ts'],
      testMatch: ['<rootDir>/tests/features/**/*.test.{ts,tsx}'],
      moduleNameMapper: alias,
      transform: webTransform,
      modulePathIgnorePatterns: ['<rootDir>/dist/', '<rootDir>/.data/'],
    },
    nodeProject('e2e', ['e2e'], { setupFilesAfterEnv: ['<rootDir>/tests/support/e2e-timeout.ts'] }),
  ],
};
