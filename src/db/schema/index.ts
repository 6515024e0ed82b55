export * from './analyses';
export * from './campaigns';
export * from './decisions';
export * from './people';
export * from './screens';
