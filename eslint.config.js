import { readdirSync, existsSync } from 'node:fs'
import reactHooks from 'eslint-plugin-react-hooks'
import tseslint from 'typescript-eslint'

const forbid = (files, patterns) => ({ files, rules: { 'no-restricted-imports': ['error', { patterns }] } })
const features = existsSync('src/features') ? readdirSync('src/features') : []

export default tseslint.config(
  { ignores: ['dist', 'coverage', 'node_modules', '.data', 'public'] },
  ...tseslint.configs.recommendedTypeChecked,
  { languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } } },
  { files: ['src/**/*.{ts,tsx}'], ...reactHooks.configs.flat['recommended-latest'] },
  { files: ['**/*.js'], ...tseslint.configs.disableTypeChecked },
  {
    files: ['**/*.{ts,tsx}'],
    rules: {
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false, arguments: false } }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
    },
  },
  // The arrows of the house: shared imports nothing of ours and no I/O; src never imports the server; no feature imports another.
  forbid(['shared/**/*.ts'], [
    { regex: '^(@/|(\\.\\./)+(src|server|scripts|tests)/)', message: 'shared/ imports neither src/ nor server/.' },
    { regex: '^(node:|react|express|sequelize|pg$|fs$|path$)', message: 'shared/ is pure: no I/O and no framework.' },
  ]),
  forbid(['server/**/*.ts'], [{ regex: '^(@/|(\\.\\./)+src/)', message: 'server/ never imports src/.' }]),
  forbid(['src/**/*.{ts,tsx}'], [{ regex: '^(@server|(\\.\\./)+server/)', message: 'src/ never imports server/.' }]),
  ...features.map((name) =>
    forbid([`src/features/${name}/**/*.{ts,tsx}`], [
      { regex: '^(@server|(\\.\\./)+server/)', message: 'src/ never imports server/.' },
      { regex: `^(@/features/|(\\.\\./)+(features/)?(${features.filter((f) => f !== name).join('|') || '-'})/)`, message: 'A feature never imports another: move what both need to components/, lib/ or shared/.' },
    ]),
  ),
  { files: ['shared/**/*.ts'], rules: { 'no-restricted-syntax': ['error',
    { selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']", message: 'shared/ reads no clock.' },
    { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: 'shared/ reads no clock.' },
    { selector: "CallExpression[callee.object.name='Math'][callee.property.name='random']", message: 'shared/ has no randomness.' }] } },
)
