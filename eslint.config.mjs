import next from 'eslint-config-next/core-web-vitals'
import typescript from 'eslint-config-next/typescript'

const pen = {
  files: ['**/*.ts', '**/*.tsx'],
  rules: {
    '@typescript-eslint/consistent-type-definitions': ['error', 'type'],
    '@typescript-eslint/no-explicit-any': 'error',
    '@typescript-eslint/no-non-null-assertion': 'error',
    '@typescript-eslint/ban-ts-comment': 'error',
    '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
    '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
    'no-restricted-syntax': [
      'error',
      { selector: 'TSEnumDeclaration', message: 'A closed list is an `as const` array.' },
      { selector: 'ClassDeclaration', message: 'Functions, not classes.' },
    ],
    'no-console': ['error', { allow: ['error', 'warn'] }],
    eqeqeq: ['error', 'always', { null: 'ignore' }],
    'prefer-const': 'error',
  },
}

const commandLine = {
  files: ['scripts/**'],
  rules: { 'no-console': 'off' },
}

const config = [
  {
    ignores: [
      '.next/**',
      'public/pdfjs/**',
      'data/**',
      'uploads/**',
      'next-env.d.ts',
      'test-results/**',
      'playwright-report/**',
      '.demo/**',
    ],
  },
  ...next,
  ...typescript,
  pen,
  commandLine,
]

export default config
