import { accountApi } from './accounts/account-api';
import { serviceApi } from './http/api-routes';
import type { Operation } from './http/operation';

/** Every route of the application, as its resource describes it. */
export const operations: readonly Operation[] = [...accountApi, ...serviceApi];
