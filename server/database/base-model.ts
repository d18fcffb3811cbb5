import { randomUUID } from 'node:crypto';
import { Model } from 'objection';

/** A row whose id is made here: it is known before the row is stored. */
export class BaseModel extends Model {
  declare id: string;

  override $beforeInsert(): void {
    if (!Object.hasOwn(this, 'id')) this.id = randomUUID();
  }
}
