import { html, type Markup } from './html';

/** What the page of the API reads of a JSON schema. */
export interface SchemaNode {
  readonly $ref?: string;
  readonly type?: string | readonly string[];
  readonly format?: string;
  readonly description?: string;
  readonly enum?: readonly unknown[];
  readonly const?: unknown;
  readonly minimum?: number;
  readonly maximum?: number;
  readonly minLength?: number;
  readonly maxLength?: number;
  readonly properties?: Readonly<Record<string, SchemaNode>>;
  readonly required?: readonly string[];
  readonly items?: SchemaNode;
  readonly anyOf?: readonly SchemaNode[];
  readonly oneOf?: readonly SchemaNode[];
  readonly allOf?: readonly SchemaNode[];
}

/** A JSON schema in words: a table where it has fields, a link where it is described elsewhere. */
export function describeSchema(schema: SchemaNode): Markup {
  if (schema.$ref) {
    const name = schema.$ref.slice(schema.$ref.lastIndexOf('/') + 1);
    return html`<a href="#${name}">${name}</a>`;
  }
  const choices = schema.anyOf ?? schema.oneOf ?? schema.allOf;
  if (choices) {
    const joint = schema.allOf ? 'all of' : 'one of';
    return html`${joint}
      <ul>
        ${choices.map((choice) => html`<li>${describeSchema(choice)}</li>`)}
      </ul>`;
  }
  if (schema.properties) return describeFields(schema);
  if (schema.items) return html`list of ${describeSchema(schema.items)}`;
  return html`${describeValue(schema)}`;
}

function describeFields({ properties = {}, required = [] }: SchemaNode): Markup {
  const rows = Object.entries(properties).map(
    ([name, field]) =>
      html`<tr>
        <td>${name}</td>
        <td>
          ${describeSchema(field)}${required.includes(name) ? '' : ', may be left out'}
          ${field.description ? html`<p>${field.description}</p>` : ''}
        </td>
      </tr>`,
  );
  return html`<table>
    ${rows}
  </table>`;
}

function describeValue(schema: SchemaNode): string {
  if (schema.enum) return schema.enum.map((value) => JSON.stringify(value)).join(' | ');
  if (schema.const !== undefined) return JSON.stringify(schema.const);
  const type = typeof schema.type === 'string' ? schema.type : schema.type?.join(' or ');
  const facts = [
    schema.format,
    schema.minimum === undefined ? undefined : `from ${schema.minimum}`,
    schema.maximum === undefined ? undefined : `to ${schema.maximum}`,
    schema.minLength === undefined ? undefined : `at least ${schema.minLength} characters`,
    schema.maxLength === undefined ? undefined : `at most ${schema.maxLength} characters`,
  ].filter((fact) => fact !== undefined);
  return [type ?? 'anything', ...facts].join(', ');
}
