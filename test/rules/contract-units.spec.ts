import * as contract from '@stillpier/contract';
import * as z from 'zod';
import { describe, expect, it } from 'vitest';

const UNIT =
  /(Arcsec|Arcmin|Seconds|Minute|Second|Sidereal|Px|Mm|Um|Degrees|Hours|Bytes|Ms)$|Arcsec(PerPx|PerMinute|PerSecond)$/;

/** Numbers without a unit by their nature: counts, shares, ratios, versions. The list only shrinks. */
const UNITLESS = new Set(
  (
    'status limit points version attempt progress lines line frames used count within turns order index headerLine ' +
    'refusedCount runCount nightCount keptShare reversals binning wormTeeth scaleRatio focalLengthRatio ' +
    'aspect aspects aspectIfCured subsKeptIfCured keepAspect eccentricity correlation lag1 share phase falseAlarmProbability ' +
    'gain bestGain noiseGain gainStandardError asymmetry'
  ).split(' '),
);

/** Names that the analysis document fixes without a unit, with the unit that they have. */
const FIXED_BY_THE_DOCUMENT: Record<string, string> = {
  driftStandardError: 'arcsec per minute',
  standardError: 'that of the value beside it',
  arcsec: 'arcsec',
  ms: 'ms',
  low: 'arcsec',
  high: 'arcsec',
};

function numberNames(schema: z.core.JSONSchema.JSONSchema, name = ''): string[] {
  const parts = [schema.items, ...(schema.anyOf ?? []), ...(schema.prefixItems ?? [])].flat();
  const inside = parts.flatMap((part) => (typeof part === 'object' ? numberNames(part, name) : []));
  const properties = Object.entries(schema.properties ?? {}).flatMap(([key, property]) =>
    typeof property === 'object' ? numberNames(property, key) : [],
  );
  const own = schema.type === 'number' || schema.type === 'integer' ? [name] : [];
  return [...own, ...inside, ...properties];
}

const schemas = Object.entries(contract).flatMap(([name, value]): [string, z.ZodType][] =>
  value instanceof z.ZodType ? [[name, value]] : [],
);

describe('the contract', () => {
  it('has schemas to look at', () => {
    expect(schemas.length).toBeGreaterThan(20);
  });

  it.each(schemas)('%s names the unit of every number', (_, schema) => {
    const names = numberNames(z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }));
    const bare = names.filter(
      (name) =>
        name !== '' && !UNIT.test(name) && !UNITLESS.has(name) && !(name in FIXED_BY_THE_DOCUMENT),
    );
    expect(bare).toEqual([]);
  });
});
