import type { NightSummary } from '@stillpier/contract';
import { csvText } from '../page/csv-text';

const COLUMNS: readonly [string, (night: NightSummary) => string | number | null][] = [
  ['date', (night) => night.date],
  ['targets', (night) => night.targets.join(' · ')],
  ['runs', (night) => night.runCount],
  ['guided_hours', (night) => night.guidedHours],
  ['frames', (night) => night.frames],
  ['frames_used', (night) => night.used],
  ['ra_rms_arcsec', (night) => night.raRmsArcsec],
  ['dec_rms_arcsec', (night) => night.decRmsArcsec],
  ['total_rms_arcsec', (night) => night.totalRmsArcsec],
  ['aspect', (night) => night.aspect],
  ['position_angle_degrees', (night) => night.positionAngleDegrees],
  ['kept_share', (night) => night.keptShare],
  ['main_limit', (night) => night.mainLimit?.code ?? null],
  ['severity', (night) => night.mainLimit?.severity ?? null],
];

/** The nights as they stand in the table, in full precision. */
export function nightsCsv(nights: readonly NightSummary[]): string {
  return csvText([
    COLUMNS.map(([head]) => head),
    ...nights.map((night) => COLUMNS.map(([, value]) => value(night))),
  ]);
}
