/** What api, worker and web agree on. Schemas and the types inferred from them; no behaviour. */
export * from './machines';
export * from './people';
export * from './problem';
export * from './programs';
export * from './report';
export * from './roles';
export * from './setup';
