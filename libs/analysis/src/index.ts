export * from './analysis-document';
export * from './rig-description';
export * from './series/log-frames';
export * from './series/run-series';
