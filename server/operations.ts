import { accountApi } from './accounts/account-api';
import { byHandApi } from './by-hand/by-hand-api';
import { columnMapApi } from './column-maps/column-map-api';
import { exportApi } from './exports/export-api';
import { serviceApi } from './http/api-routes';
import type { Operation } from './http/operation';
import { importApi } from './imports/import-api';
import { nightApi } from './nights/night-api';
import { rigApi } from './rigs/rig-api';
import { setupApi } from './setups/setup-api';
import { accessTokenApi } from './tokens/access-token-api';

/** Every route of the application, as its resource describes it. */
export const operations: readonly Operation[] = [
  ...accountApi,
  ...accessTokenApi,
  ...rigApi,
  ...setupApi,
  ...columnMapApi,
  ...importApi,
  ...nightApi,
  ...byHandApi,
  ...exportApi,
  ...serviceApi,
];
