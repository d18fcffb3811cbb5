import { runInNewContext } from 'node:vm';
import { type ColumnMap, type GuideLog, readGuideLog } from '@stillpier/guide-log';
import { build } from 'esbuild';
import { beforeAll, describe, expect, it } from 'vitest';
import { latin, utf16, utf8 } from '../support/small-guide-log';
import { sampleLogs } from '../support/sample-logs';

type Read = (chunks: Uint8Array[], options: { map: ColumnMap }) => GuideLog;

const HEADER = 'time s,ra error arcsec,dec error arcsec,target';
const DIALECTS: [name: string, bytes: Uint8Array][] = [
  ['UTF-16', utf16(`\uFEFF${HEADER}\r\n0,1,2,Höhe\r\n`, true)],
  // 0x80, 0x93 and 0x9f are where Node 20 and browsers read Windows-1252 differently.
  ['Windows-1252', latin(`${HEADER}\n0,1,2,H\xf6he \x80\x93\x9f\n`)],
  [
    'joined files with byte order marks',
    utf8(`\uFEFF${HEADER}\n0,1,2,a\n\uFEFF${HEADER}\n5,3,4,b`),
  ],
  ['quotes over lines', utf8(`${HEADER}\r0,1,2,"a\rb"\r1,3,4,"open\r2,5,6,c\r`)],
];

/** Numbers as text, in which NaN and -0 are equal to themselves alone, and no object is of another realm. */
function plain(log: GuideLog): unknown {
  const text = JSON.stringify(log, (_key, value: unknown) => {
    if (ArrayBuffer.isView(value)) return Array.from(value as Float64Array, String).join(' ');
    return typeof value === 'number' ? String(value) : value;
  });
  return JSON.parse(text);
}

describe('the reader bundled for a browser, where nothing of Node is to be had', () => {
  let readInBrowser: Read;
  beforeAll(async () => {
    const { outputFiles } = await build({
      entryPoints: ['libs/guide-log/src/index.ts'],
      bundle: true,
      platform: 'browser',
      format: 'iife',
      globalName: 'guideLog',
      write: false,
    });
    // What the web platform gives to a page and the language does not; no process, Buffer, require or global.
    const page: Record<string, unknown> = { TextDecoder, TextEncoder };
    page['self'] = page;
    const library = runInNewContext(`${outputFiles[0]?.text}; guideLog`, page) as {
      readGuideLog: Read;
    };
    expect(runInNewContext('typeof process + typeof Buffer + typeof require', page)).toBe(
      'undefinedundefinedundefined',
    );
    readInBrowser = (chunks, options) => library.readGuideLog(chunks, options);
  });

  it.each(sampleLogs())('makes the frames of the server of $file', ({ bytes, map }) => {
    const inBrowser = readInBrowser([bytes], { map });
    const onServer = readGuideLog(bytes, { map });
    expect(onServer.frames.count).toBeGreaterThan(1000);
    expect(plain(inBrowser)).toEqual(plain(onServer));
  });

  it.each(DIALECTS)('makes the frames of the server of %s', (_name, bytes) => {
    const inBrowser = readInBrowser([bytes], { map: {} });
    expect(plain(inBrowser)).toEqual(plain(readGuideLog(bytes)));
  });
});
