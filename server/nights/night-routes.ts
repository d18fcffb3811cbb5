import {
  nightPaths,
  nightSchema,
  nightSummarySchema,
  pageOf,
  pageQuerySchema,
  rigStateSchema,
  seriesQuerySchema,
  spectrumCurveSchema,
} from '@stillpier/contract';
import { Router } from 'express';
import * as z from 'zod';
import { readParameters, readRequest } from '../http/read-request';
import { requireAccount } from '../http/signed-in';
import type { NightService } from './night-service';
import type { RigStateService } from './rig-state-service';
import type { RunSeriesService } from './run-series-service';

const nightPageSchema = pageOf(nightSummarySchema);
const rigParametersSchema = z.object({ rigId: z.uuid() });
const nightParametersSchema = z.object({ rigId: z.uuid(), date: z.iso.date() });
const runParametersSchema = z.object({ rigId: z.uuid(), runId: z.uuid() });

interface NightParts {
  readonly nights: NightService;
  readonly rigStates: RigStateService;
  readonly runSeries: RunSeriesService;
}

export function nightRoutes({ nights, rigStates, runSeries }: NightParts): Router {
  const router = Router();

  router.get(nightPaths.rigStates, async (req, res) => {
    const account = requireAccount(req);
    res.json(z.array(rigStateSchema).parse(await rigStates.list(account.id)));
  });

  router.get(nightPaths.all(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readParameters(rigParametersSchema, req.params);
    const query = readRequest(pageQuerySchema, req.query);
    res.json(nightPageSchema.parse(await nights.list(account.id, rigId, query)));
  });

  router.get(nightPaths.one(':rigId', ':date'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, date } = readParameters(nightParametersSchema, req.params);
    res.json(nightSchema.parse(await nights.one(account.id, rigId, date)));
  });

  router.get(nightPaths.series(':rigId', ':runId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, runId } = readParameters(runParametersSchema, req.params);
    const query = readRequest(seriesQuerySchema, req.query);
    const stretch = await runSeries.series(account.id, rigId, runId, query);
    res.type('application/octet-stream').send(stretch);
  });

  router.get(nightPaths.spectrum(':rigId', ':runId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, runId } = readParameters(runParametersSchema, req.params);
    res.json(spectrumCurveSchema.parse(await runSeries.spectrum(account.id, rigId, runId)));
  });

  return router;
}
