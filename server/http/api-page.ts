import { html, Markup } from './html';
import { type OpenApiDocument, PROBLEM_TYPE } from './openapi';
import { describeSchema, type SchemaNode } from './schema-words';

interface ApiContent {
  readonly content?: Readonly<Record<string, { readonly schema?: SchemaNode }>>;
}
interface ApiParameter {
  readonly name: string;
  readonly in: string;
  readonly required?: boolean;
  readonly description?: string;
  readonly schema?: SchemaNode;
}
interface ApiOperation {
  readonly summary?: string;
  readonly tags?: readonly string[];
  readonly security?: readonly object[];
  readonly parameters?: readonly ApiParameter[];
  readonly requestBody?: ApiContent;
  readonly responses: Readonly<Record<string, ApiContent & { readonly description: string }>>;
}

const STYLE = `
  :root { color-scheme: light dark; --paper: light-dark(#f7f2e7, #1b2129); --ink: light-dark(#221f19, #ece7da);
    --quiet: light-dark(#5b5446, #b1b2ac); --rule: light-dark(#dcd3bf, #343d48); --mark: light-dark(#7a2f47, #dfa0b6) }
  body { margin: 0 auto; max-width: 920px; padding: 24px 16px 72px; background: var(--paper); color: var(--ink);
    font: 16px/24px 'Atkinson Hyperlegible Next', Verdana, sans-serif }
  header { border-bottom: 3px solid } h1 { font-size: 34px; line-height: 43px; font-weight: 430 }
  h2 { margin: 52px 0 0; font-size: 20px } article { margin: 24px 0; padding-top: 9px; border-top: 1px solid }
  h3 { margin: 0; font-size: 16px; font-weight: 500 } code, td:first-child { font: 13.5px/20px 'Roboto Mono', monospace; overflow-wrap: anywhere }
  h4 { margin: 16px 0 4px; font-size: 14px; color: var(--quiet) } p { margin: 4px 0 }
  table { width: 100%; border-collapse: collapse; table-layout: fixed } td { padding: 4px 12px 4px 0; border-bottom: 1px solid var(--rule); vertical-align: top }
  td:first-child { width: 28% } a { color: var(--mark) } ul { margin: 0; padding-left: 20px }`;

/** The OpenAPI document as a page that needs no script. */
export function writeApiPage(document: OpenApiDocument, nonce: string): string {
  const operations = Object.entries(document.paths ?? {}).flatMap(([path, item]) =>
    Object.entries(item as Record<string, ApiOperation>).map(([method, operation]) => ({
      title: `${method.toUpperCase()} ${path}`,
      operation,
    })),
  );
  const tags = [...new Set(operations.map(({ operation }) => operation.tags?.[0] ?? ''))];
  const schemas = Object.entries(
    (document.components?.schemas ?? {}) as Record<string, SchemaNode>,
  );
  return html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width,initial-scale=1" />
        <title>The API · Stillpier</title>
        <style nonce="${nonce}">
          ${new Markup(STYLE)}
        </style>
      </head>
      <body>
        <header><h1>The API of Stillpier</h1></header>
        <p>
          ${document.info.description ?? ''} The same as a document:
          <a href="/api/v1/openapi.json">openapi.json</a>. Every refusal is a
          <a href="#Problem">Problem</a>.
        </p>
        ${tags.map(
          (tag) =>
            html`<h2>${tag}</h2>
              ${operations
                .filter(({ operation }) => operation.tags?.[0] === tag)
                .map(({ title, operation }) => writeOperation(title, operation))}`,
        )}
        <h2>Documents</h2>
        ${schemas.map(
          ([name, schema]) =>
            html`<article id="${name}">
              <h3>${name}</h3>
              ${describeSchema(schema)}
            </article>`,
        )}
      </body>
    </html>`.text;
}

function writeOperation(title: string, operation: ApiOperation): Markup {
  const signedIn = (operation.security ?? []).length > 0;
  const all = Object.entries(operation.responses);
  const answers = all.filter(([, answer]) => !isProblem(answer));
  const refusals = all
    .filter(([, answer]) => isProblem(answer))
    .map(([status, { description }]) => `${status} ${description}`);
  return html`<article>
    <h3><code>${title}</code></h3>
    <p>${operation.summary ?? ''}${signedIn ? ' (signed in)' : ''}</p>
    ${writeParameters(operation.parameters ?? [])}
    ${operation.requestBody ? [writeContent('Body', operation.requestBody)] : []}
    ${answers.map(([status, answer]) => writeContent(`${status} ${answer.description}`, answer))}
    ${
      refusals.length > 0
        ? html`<h4>Refusals</h4>
            <p>${refusals.join(', ')}</p>`
        : ''
    }
  </article>`;
}

function isProblem({ content }: ApiContent): boolean {
  return content !== undefined && PROBLEM_TYPE in content;
}

function writeParameters(parameters: readonly ApiParameter[]): Markup {
  if (parameters.length === 0) return html``;
  const rows = parameters.map(
    (parameter) =>
      html`<tr>
        <td>${parameter.name}</td>
        <td>
          ${parameter.in}${parameter.required ? '' : ', may be left out'}
          ${parameter.schema ? describeSchema(parameter.schema) : ''} ${parameter.description ?? ''}
        </td>
      </tr>`,
  );
  return html`<h4>Parameters</h4>
    <table>
      ${rows}
    </table>`;
}

function writeContent(title: string, { content }: ApiContent): Markup {
  const bodies = Object.entries(content ?? {}).map(
    ([type, { schema }]) =>
      html`${type === 'application/json' ? '' : html`<p>${type}</p>`}
      ${schema ? describeSchema(schema) : ''}`,
  );
  return html`<h4>${title}</h4>
    ${bodies}`;
}
