import * as contract from '@stillpier/contract';
import * as guideLog from '@stillpier/guide-log';
import { describe, expect, it } from 'vitest';

// The reader may not import the contract, nor the contract the reader: each has its own list.
describe('the column map of the contract', () => {
  it('knows the roles of the reader, and no other', () => {
    expect(contract.COLUMN_ROLES).toEqual(guideLog.COLUMN_ROLES);
  });

  it('knows the units of the reader, and no other', () => {
    expect(contract.COLUMN_UNITS).toEqual(guideLog.COLUMN_UNITS);
  });

  it.each(guideLog.COLUMN_ROLES.map((role) => [role, guideLog.UNITS_OF_ROLE[role]] as const))(
    'takes %s with every unit that the reader takes for it',
    (role, units) => {
      for (const unit of [undefined, ...units]) {
        const columns = { a: { role, unit } };
        expect(contract.columnMapSchema.safeParse({ columns }).success).toBe(true);
      }
    },
  );

  it.each(guideLog.FRAME_STATES)('takes the state %s', (state) => {
    expect(contract.columnMapSchema.safeParse({ states: { x: state } }).success).toBe(true);
  });

  it.each(guideLog.DATE_ORDERS)('takes the order %s of dates', (dateOrder) => {
    expect(contract.columnMapSchema.safeParse({ dateOrder }).success).toBe(true);
  });
});
