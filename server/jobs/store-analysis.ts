import { ANALYSIS_VERSION, type AnalysedSeries, type LogAnalysis } from '@stillpier/analysis';
import {
  type Run,
  SERIES_CHANNELS,
  type SeriesChannel,
  type SpectrumCurve,
} from '@stillpier/contract';
import type { Knex } from 'knex';
import { nightDateOf } from '../nights/night-date';
import { packFloat32, packFloat64 } from '../nights/packed-series';
import { holdRig, recomputeNights } from '../nights/recompute-nights';
import { RunModel } from '../nights/run-model';
import { RunSeriesModel } from '../nights/run-series-model';
import { type ImportTurn, TakenOverError } from './import-turn';
import { runIdOf } from './run-id';

interface Analysed {
  readonly analysis: LogAnalysis;
  /** Where each run begins, in seconds since the first frame of the log. */
  readonly offsetsSeconds: readonly number[];
  readonly correctionUnit: 'ms' | 'arcsec' | null;
  readonly seeingFwhmArcsec: number | null;
}

/**
 * Puts what was found in place of what an earlier reading of the import left, all or nothing: runs, series, nights and
 * the finished import.
 */
export async function storeAnalysis(
  knex: Knex,
  turn: ImportTurn,
  { analysis, offsetsSeconds, correctionUnit, seeingFwhmArcsec }: Analysed,
): Promise<void> {
  const { id: importId, rigId, setupId } = turn.row;
  const { document } = analysis;
  await knex.transaction(async (trx) => {
    const rig = await holdRig(trx, rigId);
    if (!rig) throw new TakenOverError(`rig ${rigId} is gone`);
    await turn.end(trx, {
      ...{ state: 'done', stage: 'Done', progress: 1, error: null },
      ...{ document, analysisVersion: ANALYSIS_VERSION },
      lineCount: document.reading.lines,
      frameCount: document.reading.frames,
      refusedCount: document.reading.refusedCount,
    });
    const earlier = await RunModel.query(trx).where({ importId }).delete().returning('night');
    const nights = new Set(earlier.map(({ night }) => night));
    for (const [at, analysedRun] of analysis.runs.entries()) {
      const run = document.runs[at];
      const logOffsetSeconds = offsetsSeconds[at];
      if (!run || logOffsetSeconds === undefined) {
        throw new Error('The analysis has series without a run');
      }
      const id = runIdOf(importId, run.index);
      const night = nightDateOf(startOf(run), rig.site.timeZone);
      nights.add(night);
      await RunModel.query(trx).insert({
        ...{ id, rigId, importId, setupId, night, seeingFwhmArcsec, run },
        ...{ logOffsetSeconds, correctionUnit },
        ...measuresOf(run),
        optics: document.optics,
        spectrum: spectrumOf(analysedRun),
      });
      for (const channel of seriesOf(id, analysedRun)) {
        await RunSeriesModel.query(trx).insert(channel);
      }
    }
    await recomputeNights(trx, rigId, nights);
  });
}

/** The document's measures that are sorted and filtered by. */
function measuresOf(run: Run) {
  return {
    runIndex: run.index,
    target: run.target,
    startsAt: startOf(run),
    durationSeconds: run.durationSeconds,
    frames: run.frames,
    used: run.used,
    raRmsArcsec: run.ra?.rmsArcsec ?? null,
    decRmsArcsec: run.dec?.rmsArcsec ?? null,
    totalRmsArcsec: run.total?.rmsArcsec ?? null,
    aspect: run.footprint?.aspect ?? null,
    positionAngleDegrees: run.footprint?.positionAngleDegrees ?? null,
    subs: run.subs?.count ?? null,
    subsWithin: run.subs?.within ?? null,
  };
}

function startOf({ index, start }: Run): Date {
  if (start === null) throw new Error(`Run ${index} has no start`); // refused before the analysis
  return new Date(start);
}

function spectrumOf({ spectrumCurve }: AnalysedSeries): SpectrumCurve | null {
  return (
    spectrumCurve && {
      periodSeconds: [...spectrumCurve.periodsSeconds],
      raAmplitudeArcsec: [...spectrumCurve.raAmplitudeArcsec],
      decAmplitudeArcsec: [...spectrumCurve.decAmplitudeArcsec],
    }
  );
}

/** One row a channel; what the log does not have has no row. */
function seriesOf(runId: string, run: AnalysedSeries) {
  const { series } = run;
  if (!series) return []; // in guide pixels, without a scale
  const channels: Record<SeriesChannel, ArrayLike<number> | null> = {
    raError: series.raErrorArcsec,
    decError: series.decErrorArcsec,
    raCorrection: series.raCorrection,
    decCorrection: series.decCorrection,
    raUncorrected: run.uncorrectedRaArcsec,
    decUncorrected: run.uncorrectedDecArcsec,
    setAside: series.setAside,
  };
  const rows = SERIES_CHANNELS.flatMap((channel) => {
    const samples = channels[channel];
    return samples ? [{ runId, channel, samples: packFloat32(samples) }] : [];
  });
  return [{ runId, channel: 'time' as const, samples: packFloat64(series.timeSeconds) }, ...rows];
}
