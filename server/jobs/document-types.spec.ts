import type * as analysis from '@stillpier/analysis';
import type * as contract from '@stillpier/contract';
import type * as guideLog from '@stillpier/guide-log';
import { expectTypeOf, it } from 'vitest';

// The compiler holds these: the libraries know nothing of each other, and the server hands one's results to the next.
it('the document of the analysis is that of the contract', () => {
  expectTypeOf<analysis.AnalysisDocument>().toExtend<contract.AnalysisDocument>();
  expectTypeOf<contract.AnalysisDocument>().toExtend<analysis.AnalysisDocument>();
});

it('the frames of the reader are those that the analysis takes', () => {
  expectTypeOf<guideLog.LogFrames>().toExtend<analysis.LogFrames>();
  expectTypeOf<guideLog.Reading>().toExtend<analysis.Reading>();
});

it('the column map of the contract is that of the reader', () => {
  expectTypeOf<contract.ColumnMap>().toExtend<guideLog.ColumnMap>();
});
