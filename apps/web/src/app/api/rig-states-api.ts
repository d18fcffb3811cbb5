import { httpResource, type HttpResourceRef } from '@angular/common/http';
import { Injectable } from '@angular/core';
import { nightPaths, type RigState, rigStateSchema } from '@stillpier/contract';
import * as z from 'zod';

const rigStateListSchema = z.array(rigStateSchema);

@Injectable({ providedIn: 'root' })
export class RigStatesApi {
  /** How each rig of the account stands after its last night. */
  list(): HttpResourceRef<RigState[] | undefined> {
    return httpResource(() => nightPaths.rigStates, {
      parse: (body) => rigStateListSchema.parse(body),
    });
  }
}
