import { createReadStream, createWriteStream, mkdtempSync, rmSync } from 'node:fs';
import { once } from 'node:events';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Papa from 'papaparse';
import { createLogReader } from '@stillpier/guide-log';

// Reading a long log into frames against Papa Parse alone (rows as arrays, no typing), each in turn, best of three.
const LINES = 1_000_000;
const START = Date.UTC(2026, 2, 14, 20);
const HEADER =
  'timestamp,ra_error_arcsec,dec_error_arcsec,ra_correction_ms,dec_correction_ms,snr,brightness,state,run,target,declination,hour_angle_h';

async function writeLog(path: string): Promise<void> {
  const file = createWriteStream(path);
  file.write(`${HEADER}\n`);
  for (let from = 0; from < LINES; from += 10_000) {
    let text = '';
    for (let n = from; n < from + 10_000; n++) {
      const ra = Math.sin(n / 75) * 0.61 + Math.sin(n * 1.7) * 0.2;
      const dec = Math.cos(n / 91) * 0.43;
      text += `${new Date(START + n * 2013).toISOString()},${ra.toFixed(4)},${dec.toFixed(4)},${Math.round(ra * -80)},${Math.round(dec * -70)},${(18 + dec).toFixed(2)},${Math.round(52_000 + ra * 900)},guiding,1,Lantern,41.27,${(-2 + n * 1e-6).toFixed(4)}\n`;
    }
    if (!file.write(text)) await once(file, 'drain');
  }
  file.end();
  await once(file, 'close');
}

/** Processor time and not the clock's: other work on the machine must not count. */
async function cpuSeconds(work: () => Promise<void>): Promise<number> {
  const start = process.cpuUsage();
  await work();
  const { user, system } = process.cpuUsage(start);
  return (user + system) / 1e6;
}

function papaAlone(path: string): Promise<void> {
  return new Promise((resolve, reject) => {
    let rows = 0;
    Papa.parse<string[]>(createReadStream(path), {
      chunk: ({ data }) => {
        rows += data.length;
      },
      complete: () => {
        if (rows < LINES) reject(new Error(`Papa Parse read ${rows} rows`));
        else resolve();
      },
      error: reject,
    });
  });
}

async function intoFrames(path: string): Promise<void> {
  const reader = createLogReader({});
  for await (const chunk of createReadStream(path)) reader.push(chunk as Uint8Array);
  const { frames } = reader.finish();
  if (frames.count !== LINES) throw new Error(`the reader read ${frames.count} frames`);
}

const folder = mkdtempSync(join(tmpdir(), 'read-log-'));
try {
  const path = join(folder, 'log.csv');
  await writeLog(path);
  const alone: number[] = [];
  const frames: number[] = [];
  for (let turn = 0; turn < 3; turn++) {
    frames.push(await cpuSeconds(() => intoFrames(path)));
    alone.push(await cpuSeconds(() => papaAlone(path)));
  }
  const [best, reference] = [Math.min(...frames), Math.min(...alone)];
  const peakMiB = Math.round(process.resourceUsage().maxRSS / 1024);
  console.log(
    `read-log: ${LINES} lines into frames ${best.toFixed(2)} s of processor, Papa Parse alone ${reference.toFixed(2)} s, ` +
      `ratio ${(best / reference).toFixed(2)} (budget 2), peak memory of both ${peakMiB} MiB (budget 400)`,
  );
} finally {
  rmSync(folder, { recursive: true });
}
