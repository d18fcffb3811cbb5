import type { NightRun, NightSummary } from '@stillpier/contract';
import type { NightModel } from './night-model';
import type { RunModel } from './run-model';

export function asNightSummary(night: NightModel): NightSummary {
  const { date, targets, runCount, guidedHours, frames, used, keptShare } = night;
  const { raRmsArcsec, decRmsArcsec, totalRmsArcsec, aspect, positionAngleDegrees } = night;
  const { mainLimitCode: code, mainLimitSeverity: severity } = night;
  return {
    ...{ date, targets, runCount, guidedHours, frames, used, keptShare },
    ...{ raRmsArcsec, decRmsArcsec, totalRmsArcsec, aspect, positionAngleDegrees },
    startsAt: night.startsAt.toISOString(),
    endsAt: night.endsAt.toISOString(),
    mainLimit: code && severity ? { code, severity } : null,
  };
}

export type RunWithSetup = RunModel & { readonly setupName: string | null };

export function asNightRun(row: RunWithSetup): NightRun {
  const { id, importId, setupId, setupName, seeingFwhmArcsec, optics, run } = row;
  return { id, importId, setupId, setupName, seeingFwhmArcsec, optics, run };
}
