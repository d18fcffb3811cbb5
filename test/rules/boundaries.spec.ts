import { ESLint } from 'eslint';
import { beforeAll, describe, expect, it } from 'vitest';

/** A forbidden import, a file that stands where it would be written, and the reason that the lint gives. */
const BROKEN_ARROWS: [arrow: string, file: string, code: string, reason: RegExp][] = [
  ['analysis → guide-log', 'libs/analysis/src/index.ts', "'@stillpier/guide-log'", /arithmetic/],
  ['analysis → Node', 'libs/analysis/src/index.ts', "'node:fs'", /arithmetic/],
  ['guide-log → analysis', 'libs/guide-log/src/index.ts', "'@stillpier/analysis'", /reads text/],
  ['contract → analysis', 'libs/contract/src/index.ts', "'@stillpier/analysis'", /imports zod/],
  ['server → client', 'server/app.ts', "'../apps/web/src/app/app'", /may not import the client/],
  ['server → Angular', 'server/app.ts', "'@angular/core'", /may not import the client/],
  ['client → server', 'apps/web/src/main.ts', "'../../../server/app'", /may not import the server/],
  ['client → Express', 'apps/web/src/main.ts', "'express'", /may not import the server/],
  ['routes → SQL', 'server/rigs/rig-routes.ts', "'knex'", /Routes know no SQL/],
  ['models → HTTP', 'server/rigs/rig-model.ts', "'express'", /Models know no HTTP/],
  [
    'figures → HTTP',
    'apps/web/src/app/figures/roundel/roundel.ts',
    "'@angular/common/http'",
    /know no HTTP/,
  ],
];

describe('the arrows of the house', () => {
  let eslint: ESLint;
  beforeAll(() => {
    eslint = new ESLint({
      // without type information, so that the file need not exist
      overrideConfig: { languageOptions: { parserOptions: { projectService: false } } },
      ruleFilter: ({ ruleId }) => ruleId.startsWith('no-restricted'),
    });
  });

  it.each(BROKEN_ARROWS)('%s is an error that says why', async (_, filePath, module, reason) => {
    const [result] = await eslint.lintText(`import ${module};\n`, { filePath });
    expect(result?.messages.map(({ message }) => message).join('\n')).toMatch(reason);
  });

  it.each(['Math.random()', 'Date.now()', 'fetch("/x")'])(
    '%s in a library is an error that says why',
    async (expression) => {
      const [result] = await eslint.lintText(`export const x = ${expression};\n`, {
        filePath: 'libs/analysis/src/index.ts',
      });
      expect(result?.messages.map(({ message }) => message).join('\n')).toMatch(
        /seeded random|no clock|both sides/,
      );
    },
  );
});
