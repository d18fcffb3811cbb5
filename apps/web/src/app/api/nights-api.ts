import { HttpClient, httpResource, type HttpResourceRef } from '@angular/common/http';
import { inject, Injectable, resource, type ResourceRef, type Signal } from '@angular/core';
import {
  type Night,
  nightPaths,
  nightSchema,
  type NightSummary,
  nightSummarySchema,
  pageOf,
  type SpectrumCurve,
  spectrumCurveSchema,
} from '@stillpier/contract';
import { firstValueFrom } from 'rxjs';
import { ERROR_CHANNELS, joinedStretches, readRunStretch, type RunStretch } from './run-stretch';

const nightPageSchema = pageOf(nightSummarySchema);
/** The most that a page of a list may hold: five years of two nights in three. */
const MOST_NIGHTS = 1000;
/** The most points of a stretch: runs up to this many frames come whole. */
const MOST_POINTS = 10_000;

export interface StretchRequest {
  readonly rigId: string;
  readonly runId: string;
  readonly fromSeconds: number;
  readonly toSeconds: number;
}

@Injectable({ providedIn: 'root' })
export class NightsApi {
  private readonly http = inject(HttpClient);

  /** Newest first; at most a thousand. */
  list(rigId: Signal<string>): HttpResourceRef<NightSummary[] | undefined> {
    return httpResource(() => ({ url: nightPaths.all(rigId()), params: { limit: MOST_NIGHTS } }), {
      parse: (body) => nightPageSchema.parse(body).items,
    });
  }

  one(rigId: Signal<string>, date: Signal<string>): HttpResourceRef<Night | undefined> {
    return httpResource(() => nightPaths.one(rigId(), date()), {
      parse: (body) => nightSchema.parse(body),
    });
  }

  /** The guide error of whole runs, by run id; asked for side by side. */
  runs(
    requests: Signal<readonly StretchRequest[] | undefined>,
  ): ResourceRef<ReadonlyMap<string, RunStretch> | undefined> {
    return resource({
      params: requests,
      loader: async ({ params }) =>
        new Map(
          await Promise.all(
            params.map(async (request) => [request.runId, await this.read(request)] as const),
          ),
        ),
    });
  }

  /** A stretch of one run, finer than the whole of it came. */
  stretch(request: Signal<StretchRequest | undefined>): ResourceRef<RunStretch | undefined> {
    return resource({ params: request, loader: ({ params }) => this.read(params) });
  }

  /** Every frame of whole runs, by run id, one run after the other: long ones come in several answers. */
  frames(
    requests: Signal<readonly StretchRequest[] | undefined>,
  ): ResourceRef<ReadonlyMap<string, RunStretch> | undefined> {
    return resource({
      params: requests,
      loader: async ({ params }) => {
        const frames = new Map<string, RunStretch>();
        for (const request of params) frames.set(request.runId, await this.readWhole(request));
        return frames;
      },
    });
  }

  private async readWhole(request: StretchRequest): Promise<RunStretch> {
    const stretch = await this.read(request);
    if (!stretch.thinned) return stretch;
    const middle = (request.fromSeconds + request.toSeconds) / 2;
    return joinedStretches([
      await this.readWhole({ ...request, toSeconds: middle }),
      await this.readWhole({ ...request, fromSeconds: middle }),
    ]);
  }

  spectrum(
    run: Signal<{ readonly rigId: string; readonly runId: string } | undefined>,
  ): HttpResourceRef<SpectrumCurve | undefined> {
    return httpResource(
      () => {
        const asked = run();
        return asked && nightPaths.spectrum(asked.rigId, asked.runId);
      },
      { parse: (body) => spectrumCurveSchema.parse(body) },
    );
  }

  private async read({ rigId, runId, ...range }: StretchRequest): Promise<RunStretch> {
    const answer = await firstValueFrom(
      this.http.get(nightPaths.series(rigId, runId), {
        responseType: 'arraybuffer',
        params: { channels: ERROR_CHANNELS.join(','), ...range, points: MOST_POINTS },
      }),
    );
    return readRunStretch(answer, range.fromSeconds, range.toSeconds);
  }
}
