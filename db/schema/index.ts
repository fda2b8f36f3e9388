export * from './auth';
export * from './firms';
export * from './inspections';
export * from './photos';
export * from './readings';
export * from './reports';
export * from './sync';
