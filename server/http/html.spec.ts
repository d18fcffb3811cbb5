import { expect, it } from 'vitest';
import { html, Markup } from './html';

it('escapes whatever could end a text or an attribute', () => {
  expect(html`<p title="${`"'`}">${'<b>&'}</p>`.text).toBe(
    '<p title="&quot;&#39;">&lt;b&gt;&amp;</p>',
  );
});

it('leaves its own parts as they are, one or many', () => {
  const parts = ['a', '<'].map((part) => html`<i>${part}</i>`);
  expect(html`<p>${parts}${new Markup('<hr>')}${7}</p>`.text).toBe(
    '<p><i>a</i>\n<i>&lt;</i><hr>7</p>',
  );
});
