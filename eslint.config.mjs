import js from '@eslint/js'
import importX from 'eslint-plugin-import-x'
import reactHooks from 'eslint-plugin-react-hooks'
import tseslint from 'typescript-eslint'

const banned = (names, why) => names.map((name) => ({ name, message: why }))
const pure = '`shared/` is pure: pass it in where it is needed.'

/** Which folder may import which: app → components → shared; server → realtime → db → shared. */
const zones = [
  { target: './shared', from: ['./app', './components', './server', './realtime', './db', './tests'] },
  { target: './components', from: ['./app', './server', './realtime', './db', './tests'] },
  { target: './app', from: ['./server', './realtime', './db', './tests'] },
  { target: './db', from: ['./app', './components', './server', './realtime', './tests'] },
  { target: './realtime', from: ['./app', './components', './server', './tests'] },
  { target: './server', from: ['./app', './components', './tests'] },
]

export default tseslint.config(
  { ignores: ['node_modules', 'dist', '.data', '.expo', 'tests/artefacts', 'fonts/**/*.js', '*.config.js'] },
  js.configs.recommended,
  ...tseslint.configs.recommended,
  {
    plugins: { 'import-x': importX, 'react-hooks': reactHooks },
    settings: { 'import-x/resolver': { typescript: true, node: true } },
    rules: {
      'import-x/no-restricted-paths': ['error', { zones }],
      'import-x/no-cycle': ['error', { ignoreExternal: true }],
      'import-x/no-default-export': 'error',
      'react-hooks/rules-of-hooks': 'error',
      'react-hooks/exhaustive-deps': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
    },
  },
  {
    // The framework finds its routes by their default exports.
    files: ['app/**/*.tsx', '*.config.*', 'eslint.config.mjs'],
    rules: { 'import-x/no-default-export': 'off' },
  },
  {
    files: ['shared/**/*.ts'],
    rules: {
      'no-restricted-globals': [
        'error',
        ...banned(
          ['process', 'window', 'document', 'navigator', 'console', 'fetch', 'setTimeout', 'setInterval'],
          pure,
        ),
        ...banned(
          ['requestAnimationFrame', 'localStorage', 'performance', 'crypto', 'WebSocket', 'Buffer'],
          pure,
        ),
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: pure },
        { object: 'Date', property: 'now', message: pure },
      ],
      'no-restricted-syntax': [
        'error',
        { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: pure },
      ],
      'no-restricted-imports': [
        'error',
        {
          patterns: [
            {
              group: ['react', 'react-*', 'expo*', 'node:*', 'fs', 'path', 'socket.io*', 'ws'],
              message: pure,
            },
          ],
        },
      ],
    },
  },
  {
    // Plain views carry no name for a screen reader: only the primitives in components/ui touch them.
    files: ['app/**/*.tsx', 'components/**/*.tsx'],
    ignores: ['components/ui/**', 'components/score/**', 'components/ladder/**'],
    rules: {
      'no-restricted-imports': [
        'error',
        {
          paths: [
            {
              name: 'react-native',
              importNames: [
                'Pressable',
                'TouchableOpacity',
                'TouchableHighlight',
                'Button',
                'TextInput',
                'Text',
              ],
              message: 'Use the named, labelled primitives of components/ui.',
            },
          ],
        },
      ],
    },
  },
  {
    // What a rule tells of itself is not in browsers, but for what words a finding (bundling/plain-rules.js).
    files: ['app/**/*.tsx', 'components/**/*.{ts,tsx}'],
    rules: {
      'no-restricted-syntax': [
        'error',
        {
          selector:
            'MemberExpression[object.property.name="explain"][property.name=/^(statement|why|sources|right|wrong|disagreement)$/]',
          message: 'Not in browsers: read it from the rule book, by useRuleBook.',
        },
      ],
    },
  },
  {
    // Runs in the page before anything else, as it stands.
    files: ['public/**/*.js'],
    languageOptions: { globals: { document: 'readonly', localStorage: 'readonly' } },
  },
  {
    files: ['**/*.mjs', '**/*.js'],
    languageOptions: {
      globals: {
        process: 'readonly',
        console: 'readonly',
        URL: 'readonly',
        setTimeout: 'readonly',
        fetch: 'readonly',
        clearTimeout: 'readonly',
        Buffer: 'readonly',
      },
    },
  },
  {
    // The bundler and babel load their configuration with `require`.
    files: ['bundling/*.js'],
    languageOptions: {
      sourceType: 'commonjs',
      globals: { module: 'readonly', require: 'readonly', __dirname: 'readonly' },
    },
    rules: { '@typescript-eslint/no-require-imports': 'off' },
  },
)
