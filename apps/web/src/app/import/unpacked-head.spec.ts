import { unpackedHead } from './unpacked-head';

async function packed(text: string): Promise<Uint8Array<ArrayBuffer>> {
  const stream = new Response(text).body!.pipeThrough(new CompressionStream('gzip'));
  return new Uint8Array(await new Response(stream).arrayBuffer());
}
const textOf = (bytes: Uint8Array) => new TextDecoder().decode(bytes);

describe('unpackedHead', () => {
  it('leaves plain bytes as they are', async () => {
    const bytes = new TextEncoder().encode('t,ra\n');
    expect(await unpackedHead(bytes)).toBe(bytes);
  });

  it('unpacks what gzip packed', async () => {
    expect(textOf(await unpackedHead(await packed('t,ra\n0,1\n')))).toBe('t,ra\n0,1\n');
  });

  it('keeps what comes before the cut, where only the first bytes are there', async () => {
    const text = Array.from({ length: 40_000 }, (_, i) => `${i},${(i * 7919) % 1000}\n`).join('');
    const whole = await packed(text);
    const head = textOf(await unpackedHead(whole.slice(0, whole.length / 2)));
    expect(head.length).toBeGreaterThan(1000);
    expect(text.startsWith(head)).toBe(true);
  });

  it('refuses what only begins like gzip', async () => {
    await expect(unpackedHead(Uint8Array.of(0x1f, 0x8b, 1, 2, 3))).rejects.toThrow();
  });
});
