import { describe, expect, it } from 'vitest';
import { type AnalysisDocument, type Finding, type FindingCode } from '../analysis-document';
import { type NightScenario, PLAIN_NIGHT } from '../simulation/night-scenario';
import { findFindings } from './find-findings';
import { diagnosed, guidedBy, QUIET_AIR, WHOLE_RIG, withDrive } from './night-fixture';

const quiet = (scenario: NightScenario): NightScenario => ({ ...scenario, seeing: QUIET_AIR });
const noWorm = { worm: { ...PLAIN_NIGHT.drive.worm, harmonics: [] } };
const line = (periodSeconds: number, amplitudeArcsec: number) => ({
  lines: [{ periodSeconds, amplitudeArcsec, phaseDegrees: 0 }],
});
const second = {
  ...PLAIN_NIGHT.runs[0]!,
  pauseSeconds: 600,
  hourAngleHours: 2,
  declinationDegrees: 40,
};
const strongWorm = {
  worm: { periodSeconds: 480, harmonics: [{ order: 1, amplitudeArcsec: 20, phaseDegrees: 0 }] },
};

const nights: Record<string, NightScenario> = {
  plain: PLAIN_NIGHT,
  noise: withDrive(noWorm),
  'strong worm': quiet(withDrive(strongWorm)),
  'named gear': quiet(withDrive({ ...noWorm, ...line(37, 1.5) })),
  'unnamed line': quiet(withDrive({ ...noWorm, ...line(23, 1.2) })),
  'polar error': {
    ...PLAIN_NIGHT,
    polar: { azimuthArcmin: 9, altitudeArcmin: 7 },
    runs: [PLAIN_NIGHT.runs[0]!, second],
  },
  backlash: withDrive({ decBacklashArcsec: 3 }),
  'strong loop': guidedBy(PLAIN_NIGHT, { gain: 1.5 }),
  'soft loop': quiet(guidedBy(PLAIN_NIGHT, { gain: 0.2 })),
  asymmetry: guidedBy(PLAIN_NIGHT, { response: { positive: 1.2, negative: 0.85 } }),
  'wrong rate': guidedBy(PLAIN_NIGHT, { response: { positive: 0.5, negative: 0.5 } }),
  gusts: { ...PLAIN_NIGHT, gusts: { perHour: 30, sizeArcsec: 5, fadeSeconds: 3 } },
  cloud: { ...PLAIN_NIGHT, clouds: [{ fromSeconds: 1000, toSeconds: 2500 }] },
  short: { ...PLAIN_NIGHT, runs: [{ ...PLAIN_NIGHT.runs[0]!, durationSeconds: 400 }] },
};
const documents = new Map<string, AnalysisDocument>();
const documentOf = (name: string): AnalysisDocument => {
  const known = documents.get(name) ?? diagnosed(nights[name]!, 1, WHOLE_RIG);
  documents.set(name, known);
  return known;
};
const findingsOf = (name: string): Finding[] => documentOf(name).runs[0]!.findings;
const found = (name: string, code: FindingCode) =>
  findingsOf(name).find((finding) => finding.code === code);

describe('findings on simulated nights', () => {
  const expected: [string, FindingCode, string, string][] = [
    ['strong worm', 'periodic-error', 'act', 'Shorten'], // 0.25 arcsec a second outruns the loop
    ['named gear', 'gear-line', 'watch', 'transfer gear'],
    ['unnamed line', 'unnamed-line', 'watch', 'Compare'],
    ['polar error', 'polar-alignment', 'watch', 'west'], // the axis lies 9 arcmin east
    ['backlash', 'backlash', 'watch', 'Dec'],
    ['strong loop', 'over-correction', 'act', 'Lower'],
    ['soft loop', 'under-correction', 'act', 'Raise'],
    ['asymmetry', 'response-asymmetry', 'watch', 'Balance'],
    ['wrong rate', 'response-off', 'watch', 'calibrate'],
    ['gusts', 'gusts', 'act', 'cables'],
    ['cloud', 'star-lost', 'act', 'cloud'],
    ['short', 'too-short', 'fine', 'longer'],
    ['noise', 'seeing-limited', 'fine', 'screwdriver'],
  ];
  it.each(expected)('%s gives %s', (name, code, severity, advice) => {
    const finding = found(name, code)!;
    const order = ['fine', 'watch', 'act'];
    expect(order.indexOf(finding.severity)).toBeGreaterThanOrEqual(order.indexOf(severity));
    expect(finding.nextStep).toContain(advice);
  });

  it('nothing about the mount shouts on a plain night under seeing (SCIENCE 4, PRODUCT)', () => {
    expect(findingsOf('plain').every(({ severity }) => severity === 'fine')).toBe(true);
    expect(found('plain', 'periodic-error')!.sentence).toContain('guided out');
  });

  it('the worst comes first', () => {
    for (const name of Object.keys(nights)) {
      const ranks = findingsOf(name).map(({ severity }) =>
        ['act', 'watch', 'fine'].indexOf(severity),
      );
      expect(ranks).toEqual([...ranks].sort((a, b) => a - b));
    }
  });

  it('a note has at most 45 words, an order and no exclamation mark (DESIGN 7)', () => {
    for (const name of Object.keys(nights)) {
      for (const { sentence, evidence, nextStep } of findingsOf(name)) {
        const note = [sentence, ...evidence, nextStep].join(' ');
        expect(note.split(/\s+/).length, note).toBeLessThanOrEqual(45);
        expect(note).not.toMatch(/!|NaN|undefined|null|Infinity/);
        expect(nextStep).toMatch(/^[A-Z][a-z]+ /);
      }
    }
  });

  it('work near weights, gears and mains carries its caution (SCIENCE 8)', () => {
    expect(found('backlash', 'backlash')!.caution).toContain('power off');
    expect(found('named gear', 'gear-line')!.caution).toContain('warranty');
    expect(found('asymmetry', 'response-asymmetry')!.caution).toContain('counterweights');
    expect(found('gusts', 'gusts')!.caution).toContain('mains');
  });

  it('says what a cure would gain: RMS, star and subs', () => {
    const { total, budget, subs } = documentOf('strong worm').runs[0]!;
    const part = budget!.ra.find((each) => each.part === 'periodic error')!;
    const { gain } = found('strong worm', 'periodic-error')!;
    expect(gain!.rmsIfCuredArcsec).toBeLessThan(total!.rmsArcsec);
    // All lines of this night are the worm's, so finding and budget speak of the same part.
    expect(gain!.rmsIfCuredArcsec).toBeCloseTo(
      Math.sqrt(total!.rmsArcsec ** 2 - part.rmsArcsec ** 2),
      2,
    );
    expect(gain!.aspectIfCured).toBeLessThan(documentOf('strong worm').runs[0]!.footprint!.aspect);
    expect(gain!.subsKeptIfCured).toBeGreaterThanOrEqual(subs!.within);
    expect(gain!.subsKeptIfCured).toBeLessThanOrEqual(subs!.count);
  });

  it('knows the worm by the spectrum where the rig tells none', () => {
    const rig = { ...WHOLE_RIG, mount: { guideRateSidereal: 0.5 } };
    const { findings, periodicError } = diagnosed(nights['strong worm']!, 1, rig).runs[0]!;
    expect(periodicError!.periodFrom).toBe('spectrum');
    const codes = findings.map(({ code }) => code);
    expect(codes).not.toContain('unnamed-line');
    const [first = ''] = findings.find(({ code }) => code === 'periodic-error')!.evidence;
    expect(first).toMatch(/^Period from the spectrum .* [1-9]\d* % of the RA error/);
  });
});

describe('what the rig and the earlier nights add', () => {
  const run = () => documentOf('strong worm').runs[0]!;
  const context = {
    rig: WHOLE_RIG,
    optics: documentOf('strong worm').optics,
    gainCurves: { ra: null, dec: null },
    subsKept: null,
    usualPeriodicErrorArcsec: null,
    smallResponse: null,
  };
  const codes = (findings: Finding[]) => findings.map(({ code }) => code);

  it('periodic error that has grown asks for cleaning', () => {
    const usual = run().periodicError!.peakToPeakArcsec / 1.5;
    const grown = findFindings(run(), { ...context, usualPeriodicErrorArcsec: usual });
    const finding = grown.find(({ code }) => code === 'periodic-error')!;
    expect(finding.sentence).toContain('50 %');
    expect(finding.nextStep).toContain('regrease');
    expect(finding.caution).toContain('power off');
  });

  it('a Dec axis that answers small corrections by a third sticks', () => {
    const smallResponse = { ratio: 0.33, standardError: 0.05 };
    expect(codes(findFindings(run(), { ...context, smallResponse }))).toContain('stiction');
    const unsure = { ratio: 0.33, standardError: 0.3 };
    expect(codes(findFindings(run(), { ...context, smallResponse: unsure }))).not.toContain(
      'stiction',
    );
  });

  it('a guide pixel of ten imaging pixels is too coarse, and a star of half a pixel too small', () => {
    const optics = { ...context.optics, scaleRatio: 10, seeingSamplingPx: 0.5 };
    const found = codes(findFindings(run(), { ...context, optics }));
    expect(found).toContain('guide-scale-coarse');
    expect(found).toContain('sampling');
  });

  it('axes that go together ask for a calibration', () => {
    const tied = findFindings({ ...run(), correlation: 0.5 }, context);
    expect(codes(tied)).toContain('axes-correlated');
    const few = findFindings({ ...run(), correlation: 0.5, used: 40 }, context);
    expect(codes(few)).not.toContain('axes-correlated'); // five times 1/√40 is 0.79
  });

  it('a run of which nothing is known but its RMS says that nothing was found', () => {
    const bare = {
      ...run(),
      spectrum: null,
      uncorrected: null,
      periodicError: null,
      polarAlignment: null,
      backlash: null,
      response: null,
      loop: { ra: null, dec: null },
      seeingFloor: null,
      budget: null,
      correlation: 0,
    };
    expect(codes(findFindings(bare, context))).toEqual(['nothing-found']);
  });

  it('a run that is not analysed has no findings', () => {
    expect(findFindings({ ...run(), total: null }, context)).toEqual([]);
  });
});
